/** A file that cannot be read, said in words for the person who sent it. `readSpectrum` turns it into a plain record. */
export class FormatError extends Error {
  constructor(
    public readonly code: FormatErrorCode,
    message: string,
    /** Where in the file, e.g. "line 17, column 2". */
    public readonly where?: string,
  ) {
    super(message)
    this.name = 'FormatError'
  }
}

export type FormatErrorCode
  = 'empty_file' | 'binary_file' | 'nul_bytes' | 'unknown_format' | 'cut_off'
    | 'no_numbers' | 'ragged_row' | 'not_a_number' | 'not_finite' | 'decimal_comma'
    | 'columns' | 'too_few_pixels' | 'too_many_pixels' | 'too_many_columns' | 'line_too_long'
    | 'axis_not_monotonic' | 'axis_not_positive' | 'sigma_not_positive'
    | 'json_syntax' | 'json_invalid' | 'fits_truncated' | 'fits_header' | 'fits_not_one_dimensional' | 'fits_axis' | 'fits_no_image'
