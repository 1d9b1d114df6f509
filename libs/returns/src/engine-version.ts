/** Changes whenever any figure could come out differently; kept with every run. */
export const ENGINE_VERSION = '1.0.0';
