export { formatDeviation } from './format-deviation';
export { type Denominator, formatLength, type LengthFormat } from './format-length';
export { type ParsedLength, parseLength } from './parse-length';
export * from './types';
