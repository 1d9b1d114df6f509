import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const source = (lib: string) => fileURLToPath(new URL(`../../libs/${lib}/src/index.ts`, import.meta.url));

export default defineConfig({
  plugins: [react()],
  resolve: {
    alias: {
      '@quarterpoise/dto': source('dto'),
      '@quarterpoise/returns': source('returns'),
      '@quarterpoise/rules': source('rules'),
    },
  },
  server: { proxy: { '/api': 'http://127.0.0.1:4600' } },
  build: {
    target: 'es2022',
    // Screens split at their lazy routes. What every screen needs is pulled into two files that stay the same between releases.
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            { name: 'react', test: /node_modules[\\/](react|react-dom|react-router|react-router-dom|scheduler)[\\/]/ },
            { name: 'text', test: /node_modules[\\/](i18next|react-i18next|swr)[\\/]/ },
          ],
        },
      },
    },
  },
});
