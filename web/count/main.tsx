import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { ToastProvider } from '../ui/toast.tsx';
import './count.css';
import { CountPage } from './count-page.tsx';
import { keepOffline } from './offline/keep-offline.ts';

createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <ToastProvider>
      <CountPage />
    </ToastProvider>
  </StrictMode>,
);
keepOffline();
