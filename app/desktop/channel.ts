/** Names of the two channels between preload and main. */
export const TO_ENGINE = 'halosieve:to-engine';
export const TO_WINDOW = 'halosieve:to-window';
