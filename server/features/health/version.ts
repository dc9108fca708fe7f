import manifest from '../../../package.json' with { type: 'json' };

/** Version of the product that is running. */
export const VERSION = manifest.version;
