/** Every property draws the same cases on every machine; another seed draws others. */
import fc from 'fast-check';

fc.configureGlobal({seed: Number(process.env.DROPRACK_SEED ?? 1)});
