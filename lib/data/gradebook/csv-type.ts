/** RFC 4180 and RFC 7111: the media type of a file whose first row names its columns. */
export const CSV_TYPE = 'text/csv; charset=utf-8; header=present';
