/** The browser's way in. */
import '@fontsource/public-sans/latin-400.css';
import '@fontsource/public-sans/latin-600.css';
import '@fontsource/public-sans/latin-700.css';
import './styles.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './app/app.tsx';
import { applyTheme } from './lib/theme.ts';

applyTheme();

const root = document.getElementById('root');
if (root === null) throw new Error('index.html lost its #root');
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
