import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { CivilDate, Moment } from '../../../components/civil-date';
import { DueDate } from '../../../components/due-date';

/** Where the quarter stands, who has to act and by when, as two sentences. */
export function QuarterStanding({ quarter }: { quarter: QuarterView }) {
  const { t } = useTranslation('quarter');
  return (
    <>
      <p>
        <CivilDate date={quarter.opensOn} /> – <CivilDate date={quarter.closesOn} />. {t(`standing.${quarter.state}`)}
      </p>
      {quarter.publishedAt ? (
        <p>
          {t('publishedOn')} <Moment at={quarter.publishedAt} />
        </p>
      ) : (
        <p>
          {t(`nextActor.${quarter.nextActor}`)} {t('due')} <DueDate date={quarter.dueOn} daysLeft={quarter.daysLeft} />
        </p>
      )}
    </>
  );
}
