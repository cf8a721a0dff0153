/** The preparing page's way in. It sees record numbers and dates, and connects to nothing. */
import '@fontsource/public-sans/latin-400.css';
import '@fontsource/public-sans/latin-600.css';
import '@fontsource/public-sans/latin-700.css';
import '../styles.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { Notice } from '../ui/notice.tsx';
import { edition } from './edition.ts';
import { Embedded } from './embedded.tsx';
import { Offline } from './offline.tsx';
import { startWorker } from './start-worker.ts';
import { surroundingPage } from './surroundings.ts';
import { openWorkroom } from './worker-client.ts';

const root = document.getElementById('root');
if (root === null) throw new Error('prepare.html lost its #root');

const workroom = openWorkroom(await startWorker());
const now = new Date();
const today = [now.getFullYear(), now.getMonth() + 1, now.getDate()].map((part) => String(part).padStart(2, '0')).join('-');
createRoot(root).render(
  <StrictMode>
    <I18nProvider locale="en-GB">
      {!isSecureContext ? (
        <Notice kind="error" title="This page cannot lock and open key files here.">
          <p>
            Browsers allow that on addresses that begin with https and for files opened from disk. Open the registry by its https address.
          </p>
        </Notice>
      ) : edition === 'offline' ? (
        <Offline workroom={workroom} today={today} />
      ) : (
        <Embedded workroom={workroom} surroundings={surroundingPage()} today={today} />
      )}
    </I18nProvider>
  </StrictMode>,
);
