/**
 * Properties try the same cases in every run, so that a commit whose tests passed passes again.
 * `npm run soak` looks at others, and at many more of them.
 */
import fc from 'fast-check';

fc.configureGlobal({ seed: Number(process.env.PROPERTY_SEED ?? 1) });
