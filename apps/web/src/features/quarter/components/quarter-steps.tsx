import type { QuarterView } from '@quarterpoise/dto';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { currentStep, standingOf, STEPS, type Step } from '../lib/steps';
import styles from './quarter-steps.module.css';

interface QuarterStepsProps {
  quarter: QuarterView;
  /** What each step shows below its sentence; the route puts it together from the features. */
  content: Record<Step, ReactNode>;
}

/** The quarter as a list to work down, hung on a beam: the poise stands at the step whose turn it is. */
export function QuarterSteps({ quarter, content }: QuarterStepsProps) {
  const { t } = useTranslation('quarter');
  const current = currentStep(quarter);
  return (
    <ol className={styles.steps}>
      {STEPS.map((step) => {
        const standing = standingOf(step, current);
        return (
          <li key={step} className={styles[standing]} aria-current={standing === 'current' ? 'step' : undefined}>
            <span className={styles.mark} aria-hidden="true" />
            <section aria-labelledby={`step-${step}`} className={styles.body}>
              <header className={styles.head}>
                <h2 id={`step-${step}`}>{t(`step.${step}.name`)}</h2>
                <span className={styles.standing}>{t(`stepStanding.${standing}`)}</span>
              </header>
              {standing === 'current' && quarter.state !== 'computing' && (
                <p className="quiet">{t(`step.${step}.now`)}</p>
              )}
              {content[step]}
            </section>
          </li>
        );
      })}
    </ol>
  );
}
