import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Page } from '../components/page';
import { paths } from './paths';

export function NotFoundPage() {
  const { t } = useTranslation('shell');
  return (
    <Page title={t('notFound.title')}>
      <p>{t('notFound.text')}</p>
      <p>
        <Link to={paths.home}>{t('notFound.home')}</Link>
      </p>
    </Page>
  );
}
