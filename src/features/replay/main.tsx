import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { ReplayApp } from './replay-app.tsx';
import { tokenOf } from './replay-api.ts';
import '../../styles/app.css';

const root = document.getElementById('root');
if (root === null) throw new Error('the page has no #root');
createRoot(root).render(
  <StrictMode>
    <ReplayApp token={tokenOf(window.location.pathname)} />
  </StrictMode>,
);
