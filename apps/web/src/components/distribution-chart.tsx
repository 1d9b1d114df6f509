import type { RunTotals } from '@quarterpoise/dto';
import { scaleLinear } from 'd3-scale';
import { curveStepAfter, line } from 'd3-shape';
import { useTranslation } from 'react-i18next';
import { formatCount, formatPercent } from '../lib/format';
import styles from './distribution-chart.module.css';

type Distribution = RunTotals['distribution'];

interface DistributionChartProps {
  now: Distribution;
  nowName: string;
  before: Distribution | null;
  beforeName: string | null;
}

const WIDTH = 640;
const HEIGHT = 230;
const MARGIN = { top: 12, right: 12, bottom: 34, left: 46 };
/** More bins than this cannot be told apart; the outermost then hold everything beyond. */
const MOST_BINS = 40;

/** Counts per percentage point, with everything far out gathered in the first and last bin. */
function binned(distribution: Distribution, from: number, to: number): Map<number, number> {
  const bins = new Map<number, number>();
  for (const { fromPct, count } of distribution) {
    const bin = Math.min(Math.max(Math.floor(fromPct), from), to);
    bins.set(bin, (bins.get(bin) ?? 0) + count);
  }
  return bins;
}

/** The range that holds all but a hundredth of the accounts at either end, no wider than MOST_BINS. */
function range(distribution: Distribution): [number, number] {
  const sorted = distribution.toSorted((a, b) => a.fromPct - b.fromPct);
  const total = sorted.reduce((sum, { count }) => sum + count, 0);
  const at = (share: number) => {
    let seen = 0;
    for (const { fromPct, count } of sorted) {
      seen += count;
      if (seen >= total * share) return Math.floor(fromPct);
    }
    return Math.floor(sorted.at(-1)?.fromPct ?? 0);
  };
  const low = at(0.01);
  return [low, Math.min(at(0.99), low + MOST_BINS - 1)];
}

/** How many accounts earned how much, this quarter in solid bars before last quarter's outline. The same figures stand in a table below. */
export function DistributionChart({ now, nowName, before, beforeName }: DistributionChartProps) {
  const { t, i18n } = useTranslation('figures');
  const [from, to] = range([...now, ...(before ?? [])]);
  const nowBins = binned(now, from, to);
  const beforeBins = before ? binned(before, from, to) : null;
  const bins = Array.from({ length: to - from + 1 }, (_, index) => from + index);
  const most = Math.max(1, ...nowBins.values(), ...(beforeBins?.values() ?? []));
  const x = scaleLinear([from, to + 1], [MARGIN.left, WIDTH - MARGIN.right]);
  const y = scaleLinear([0, most], [HEIGHT - MARGIN.bottom, MARGIN.top]).nice(4);
  const barWidth = x(1) - x(0);
  const percent = (value: number) => formatPercent(value, i18n.language);
  const step = line<number>(
    (bin) => x(bin),
    (bin) => y(beforeBins?.get(bin) ?? 0),
  ).curve(curveStepAfter);
  // The outline goes up from the axis, along the steps, and back down to the axis.
  const outline = beforeBins && `M${x(from)},${y(0)}L${step([...bins, to + 1])?.slice(1)}`;

  if (now.length === 0) return <p className="quiet">{t('distribution.empty')}</p>;
  return (
    <figure className={styles.figure}>
      <figcaption className={styles.caption}>
        <span className={styles.keyNow}>{nowName}</span>
        {outline !== null && <span className={styles.keyBefore}>{beforeName}</span>}
      </figcaption>
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-label={t('distribution.label')} className={styles.chart}>
        {y.ticks(4).map((tick) => (
          <g key={tick}>
            <line x1={MARGIN.left} x2={WIDTH - MARGIN.right} y1={y(tick)} y2={y(tick)} className={styles.grid} />
            <text x={MARGIN.left - 6} y={y(tick)} dy="0.32em" textAnchor="end">
              {formatCount(tick, i18n.language)}
            </text>
          </g>
        ))}
        {bins.map((bin) => {
          const count = nowBins.get(bin) ?? 0;
          return (
            <rect
              key={bin}
              x={x(bin) + barWidth * 0.08}
              width={barWidth * 0.84}
              y={y(count)}
              height={y(0) - y(count)}
              className={styles.bar}
            />
          );
        })}
        {outline !== null && <path d={outline} className={styles.outline} />}
        {from <= 0 && to >= 0 && <line x1={x(0)} x2={x(0)} y1={MARGIN.top} y2={y(0)} className={styles.zero} />}
        {x.ticks(8).map((tick) => (
          <text key={tick} x={x(tick)} y={HEIGHT - 14} textAnchor="middle">
            {percent(tick)}
          </text>
        ))}
      </svg>
      <details>
        <summary>{t('distribution.asTable')}</summary>
        <div className={styles.tableBox} tabIndex={0} role="region" aria-label={t('distribution.label')}>
          <table className={styles.table}>
            <thead>
              <tr>
                <th scope="col">{t('distribution.return')}</th>
                <th scope="col">{nowName}</th>
                {beforeBins && <th scope="col">{beforeName}</th>}
              </tr>
            </thead>
            <tbody>
              {bins.map((bin) => (
                <tr key={bin}>
                  <th scope="row">{t('distribution.bin', { from: percent(bin), to: percent(bin + 1) })}</th>
                  <td className="figures">{formatCount(nowBins.get(bin) ?? 0, i18n.language)}</td>
                  {beforeBins && <td className="figures">{formatCount(beforeBins.get(bin) ?? 0, i18n.language)}</td>}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
        <p className="quiet">{t('distribution.ends')}</p>
      </details>
    </figure>
  );
}
