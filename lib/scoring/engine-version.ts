/** Raised whenever the same rubric and attempt could come to another sheet; stored sheets name the one that made them. */
export const ENGINE_VERSION = 1;
