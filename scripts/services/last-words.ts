import { existsSync, readFileSync } from 'node:fs';

const SILENT = 'it said nothing';

/** The line that names the error, if one does; otherwise the last one. Lines of the structured log give their message. */
export function lastWords(logFile: string): string {
  if (!existsSync(logFile)) return SILENT;
  const lines = readFileSync(logFile, 'utf8')
    .split('\n')
    .filter((line) => line.trim() !== '');
  const line =
    lines.findLast((one) => /^\w*Error\b|\b(FATAL|ERROR): |"level":(50|60)/.test(one)) ?? lines.at(-1) ?? SILENT;
  try {
    const { msg, err } = JSON.parse(line) as { msg?: string; err?: { message?: string } };
    return err?.message ?? msg ?? line;
  } catch {
    return line;
  }
}
