import '@fontsource-variable/noto-sans/index.css';
import '../theme/theme.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { rememberedLanguage, startTexts } from '../i18n/i18n';
import { Application } from './application';

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element #root');

void startTexts(rememberedLanguage()).then(() => {
  createRoot(root).render(
    <StrictMode>
      <Application />
    </StrictMode>,
  );
});
