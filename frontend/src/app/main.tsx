import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import '../ui/styles/index.js';
import { giveStylesTheNonce } from '../ui/theme/style-nonce.js';
import { Providers } from './providers.js';

giveStylesTheNonce();
const root = document.getElementById('root');
if (!root) throw new Error('index.html has no #root');
createRoot(root).render(<StrictMode><Providers /></StrictMode>);
