import fc from 'fast-check';

/**
 * Property tests draw the same cases in every run, so that a failure means a change of the code. To look for new cases:
 * `SWAYBOOK_SEED=12345 npm run unit`; a seed that fails is mended, and its case becomes a test of its own.
 */
fc.configureGlobal({ seed: Number(process.env.SWAYBOOK_SEED ?? 20261201) });
