/** `npm run bench`: speed as ratios in one run. Nothing here passes or fails; it prints. */
import { benchKernel } from './kernel.ts';

await benchKernel();
