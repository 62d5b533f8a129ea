/** Semantic version of the engine; it changes whenever a result may change. */
export const ENGINE_VERSION = '2.1.0';
