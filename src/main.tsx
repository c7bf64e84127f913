import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { z } from 'zod';
import { App } from '#src/app/app.tsx';
import { showStoredTheme } from '#src/lib/theme.ts';
import '#src/styles/base.css';

// The content security policy forbids code made from text, which zod would try.
z.config({ jitless: true });
showStoredTheme();

const root = document.getElementById('root');
if (root === null) throw new Error('The page has no place for the screens.');
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
