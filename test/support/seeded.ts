/**
 * Runs before every test file: property tests draw from one stated seed, so that the same commit gives the same verdict everywhere. Another
 * seed looks elsewhere: CHOPFRONT_PROPERTY_SEED=7 npm test.
 */
import fc from 'fast-check';

fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(process.env.CHOPFRONT_PROPERTY_SEED ?? 20261201) });
