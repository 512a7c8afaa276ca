/**
 * Version of the light model, stamped on every result. Raise it with any change that moves numbers,
 * and say so in CHANGELOG.md under "Numbers that changed".
 */
export const MODEL_VERSION = '1.0.0';
