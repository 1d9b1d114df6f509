import { dirname, join } from 'node:path';

/** The folder that holds package.json; scripts work the same from wherever they are called. */
export const PROJECT_ROOT = dirname(__dirname);

export const inProject = (...parts: string[]) => join(PROJECT_ROOT, ...parts);
