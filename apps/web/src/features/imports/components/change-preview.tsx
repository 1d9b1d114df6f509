import type { ImportView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Amount } from '../../../components/amount';
import { formatCount } from '../../../lib/format';
import styles from './imports.module.css';

const CHANGES = ['new', 'changed', 'reversed', 'unchanged'] as const;

/** What loading the file would change (or has changed), and its totals by kind. */
export function ChangePreview({ file, changes }: { file: ImportView; changes: NonNullable<ImportView['changes']> }) {
  const { t, i18n } = useTranslation('imports');
  const title = file.state === 'committed' ? 'done' : file.state === 'preview' ? 'would' : 'good';
  const number = (value: number) => <span className="figures">{formatCount(value, i18n.language)}</span>;
  return (
    <div className={styles.preview}>
      <section>
        <h3>{t(`changes.${title}`)}</h3>
        <dl className={styles.changes}>
          {CHANGES.map((name) => (
            <div key={name}>
              <dt>{t(`changes.${name}`)}</dt>
              <dd>{number(changes[name])}</dd>
            </div>
          ))}
        </dl>
      </section>
      {file.totalsByKind.length > 0 && (
        <section>
          <h3>{t('byKind.title')}</h3>
          <div className={styles.scroll} tabIndex={0} role="region" aria-label={t('byKind.title')}>
            <table className={styles.table}>
              <thead>
                <tr>
                  <th scope="col">{t('byKind.kind')}</th>
                  <th scope="col">{t('byKind.rows')}</th>
                  <th scope="col">{t('byKind.sum')}</th>
                </tr>
              </thead>
              <tbody>
                {file.totalsByKind.map((total) => (
                  <tr key={total.kind}>
                    <th scope="row">{t(`activityKind.${total.kind}`, { defaultValue: total.kind })}</th>
                    <td>{number(total.rows)}</td>
                    <td>
                      <Amount dollars={total.sum} />
                    </td>
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
        </section>
      )}
    </div>
  );
}
