/** Version of the engine, recorded in every assessment. It changes whenever a figure could. */
export const ENGINE_VERSION = '1.1.0';
