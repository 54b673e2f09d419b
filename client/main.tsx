import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import '#client/styles/app.css';
import { App } from '#client/app/app.tsx';
import { applyTheme } from '#client/lib/theme.ts';

applyTheme();
const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element with the id "root"');
createRoot(root).render(<StrictMode><App /></StrictMode>);
