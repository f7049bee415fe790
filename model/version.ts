/** Version of the model: it changes whenever a design's figures may. */
export const MODEL_VERSION = '0.1.0';
