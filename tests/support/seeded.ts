/* Property tests draw the same examples every time, so that a red run is about the change; FAST_CHECK_SEED draws others. */
import fc from 'fast-check';

fc.configureGlobal({ seed: Number(process.env['FAST_CHECK_SEED'] ?? 20_261_201) });
