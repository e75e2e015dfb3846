/**
 * `npm run bench [kernel|page]`: speed as ratios in one run. Nothing here passes or fails; it prints. `page` measures the built
 * page (vite build first).
 */
import { benchKernel } from './kernel.ts';
import { benchPage } from './keyToPaint.ts';

const which = process.argv[2];
if (which === undefined || which === 'kernel') await benchKernel();
if (which === undefined || which === 'page') await benchPage();
