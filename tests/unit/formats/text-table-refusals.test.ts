import { describe, expect, it } from 'vitest'
import { failure } from './helpers'

const noise = Uint8Array.from({ length: 4096 }, (_, i) => (i * 2654435761 >>> 13) % 255 + 1)

describe('a text file that cannot be read says what is wrong, where, and how to mend it', () => {
  it.each<[string, string | Uint8Array, string, string | undefined, RegExp]>([
    ['an empty file', '', 'empty_file', undefined, /empty/],
    ['blank lines only', '\n \n\n', 'no_numbers', undefined, /No row of numbers/],
    ['a heading only', 'wavelength,flux\n', 'no_numbers', undefined, /No row of numbers/],
    ['prose', 'Dear all,\nplease find the data.\n', 'no_numbers', undefined, /one row per pixel/],
    ['a NUL byte', '500,1\n501,\u0000\n', 'nul_bytes', 'byte 11', /NUL byte/],
    ['UTF-16 without a byte order mark', Uint8Array.from('500,1\n501,2', c => c.charCodeAt(0)).reduce<Uint8Array>((all, byte) => Uint8Array.from([...all, byte, 0]), new Uint8Array()), 'nul_bytes', 'byte 2', /save it as UTF-8/],
    ['binary rubbish', noise, 'binary_file', undefined, /not text/],
    ['a gzip archive that is called .csv', Uint8Array.from([0x1F, 0x8B, 8, 0]), 'unknown_format', undefined, /unpack/],
    ['a spreadsheet that is called .csv', Uint8Array.from([0x50, 0x4B, 3, 4]), 'unknown_format', undefined, /save the sheet as CSV/],
    ['one column', '500\n501\n', 'columns', 'line 1', /at least two/],
    ['one row', '500,1\n', 'too_few_pixels', undefined, /at least 2 pixels/],
    ['65 columns', Array(65).fill('1').join(' '), 'too_many_columns', 'line 1', /at most 64/],
    ['a short row', 'lambda,flux\n500,1\n501\n', 'ragged_row', 'line 3', /Line 3 has 1 column, while .* \(line 2\) has 2/],
    ['a long row', '500 1\n501 2 3\n', 'ragged_row', 'line 2', /Give every row the same columns/],
    ['a row without its last cell', '500,1,1\n501,2,\n', 'ragged_row', 'line 2', /Line 2 has 2 columns/],
    ['a heading that is wider than its rows', 'wavelength,flux,sigma\n500,1\n501,2', 'ragged_row', 'line 1', /names 3 columns/],
    ['an empty cell', '500,,1\n501,1,1', 'not_a_number', 'line 1, column 2', /empty/],
    ['an empty first cell', '500;1\n;2', 'not_a_number', 'line 2, column 1', /empty/],
    ['text in a number', '# x\nlambda,flux\n500,1\n501,1o2\n', 'not_a_number', 'line 4, column 2 (flux)', /"1o2" is not a number/],
    ['text in the first row', '500,abc\n501,2\n', 'not_a_number', 'line 1, column 2', /"abc"/],
    ['text in front of the first row', 'abc,500\n501,2\n', 'not_a_number', 'line 1, column 1', /"abc" is not a number/],
    ['a hexadecimal number', '500,0x10\n501,2', 'not_a_number', 'line 1, column 2', /0x10/],
    ['NaN', '500,1\n501,NaN\n', 'not_finite', 'line 2, column 2', /Remove the row/],
    ['NaN in the first row', 'nan,1\n501,2\n', 'not_finite', 'line 1, column 1', /not a finite number/],
    ['-Inf', '500 1\n501 -Inf\n', 'not_finite', 'line 2, column 2', /not a finite number/],
    ['a number that is too large for a double', '500 1\n501 1e999\n', 'not_finite', 'line 2, column 2', /not a finite number/],
    ['commas that may be both', '500,1,812,4\n501,1,812,5\n', 'decimal_comma', 'line 1', /semicolons or tabs/],
    ['commas that are both, by the heading', 'wavelength,flux\n500,1,812,4\n501,1,812,5\n', 'decimal_comma', 'line 1', /both separators and decimal marks/],
    ['two decimal marks', '500,5;1,5\n501.5;2\n', 'decimal_comma', 'line 2, column 1', /decimal mark of the rows before/],
    ['thousands separators', '1500;1\n1.501,5;2\n', 'decimal_comma', 'line 2, column 1', /no thousands separators/],
    ['a repeated axis value', '500,1\n501,2\n501,3\n', 'axis_not_monotonic', 'line 3', /repeats the axis value 501/],
    ['an axis that turns back', '500,1\n501,2\n500.5,3\n', 'axis_not_monotonic', 'line 3', /500.5 after 501.*sort the rows/s],
    ['a descending axis that turns back', '502,1\n501,2\n501.5,3\n', 'axis_not_monotonic', 'line 3', /against the order/],
    ['a sigma of zero', 'lambda,flux,sigma\n500,1,1\n501,2,0\n', 'sigma_not_positive', 'line 3', /sigma = 0/],
    ['a negative sigma', 'lambda,flux,sigma\n500,1,-1\n501,2,1\n', 'sigma_not_positive', 'line 2', /greater than zero/],
  ])('%s', (_, content, code, where, message) => {
    const error = failure(content)
    expect(error.code).toBe(code)
    if (where) expect(error.where).toBe(where)
    expect(error.message).toMatch(message)
  })

  it('a wavelength at or below zero', () => {
    expect(failure('-1,1\n0,2\n1,3', { axisUnit: 'nm' }).code).toBe('axis_not_positive')
  })
})
