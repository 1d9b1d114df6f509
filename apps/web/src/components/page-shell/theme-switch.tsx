import { useTranslation } from 'react-i18next';
import { THEME_CHOICES, useThemeChoice, type ThemeChoice } from '../../theme/theme-choice';
import styles from './page-shell.module.css';

export function ThemeSwitch() {
  const { t } = useTranslation('shell');
  const { choice, choose } = useThemeChoice();
  return (
    <label className={styles.field}>
      {t('theme.label')}
      <select value={choice} onChange={(event) => choose(event.target.value as ThemeChoice)}>
        {THEME_CHOICES.map((one) => (
          <option key={one} value={one}>
            {t(`theme.${one}`)}
          </option>
        ))}
      </select>
    </label>
  );
}
