"""Writes FITS spectra with astropy and prints what astropy reads from them, and from the files named on the command line, as JSON."""
import base64, io, json, sys
import numpy as np
from astropy.io import fits
from astropy.wcs import WCS


def record(name, raw):
    with fits.open(io.BytesIO(raw)) as hdus:
        hdu = hdus[0]
        scaled = np.asarray(hdu.data, dtype=np.float64).ravel()
        axis = WCS(hdu.header).pixel_to_world_values(np.arange(scaled.size)) if hdu.header['NAXIS'] == 1 else None
        unit = str(WCS(hdu.header).wcs.cunit[0])
        step = 1e10 if unit == 'm' and hdu.header.get('CUNIT1') == 'Angstrom' else 1
        values = [None if np.isnan(value) else float(value) for value in scaled]
        return {'name': name, 'file': base64.b64encode(raw).decode(), 'values': values, 'axis': [float(a) * step for a in axis]}


def written(data, **cards):
    hdu = fits.PrimaryHDU(data)
    for key, value in {'CRPIX1': 1.0, 'CRVAL1': 15857.885983745, 'CDELT1': 0.26064629441482, **cards}.items():
        hdu.header[key] = value
    buffer = io.BytesIO()
    hdu.writeto(buffer)
    return buffer.getvalue()


def scaled_int16():
    hdu = fits.PrimaryHDU(np.linspace(-3.0, 1000.0, 50))
    hdu.scale('int16', bscale=0.05, bzero=400.0)
    hdu.header.update({'CRPIX1': 3.0, 'CRVAL1': 500.0, 'CDELT1': 0.1})
    buffer = io.BytesIO()
    hdu.writeto(buffer)
    return buffer.getvalue()


rng = np.random.default_rng(1)
blank = np.arange(10, dtype=np.int32) * 1000
blank[4] = -32768
cases = {
    'int16 with BSCALE and BZERO': scaled_int16(),
    'unsigned 16-bit through BZERO': written(np.array([0, 1, 40000, 65535], dtype=np.uint16)),
    'uint8': written(np.arange(256, dtype=np.uint8)),
    'int32 with BLANK': written(blank, BLANK=-32768, BSCALE=0.5),
    'int64': written(np.array([-2**40, 0, 2**52 + 1], dtype=np.int64)),
    'float32': written(rng.normal(size=500).astype(np.float32)),
    'float64 with NaN': written(np.array([1.0, np.nan, 1e300, -5e-324])),
    'float64 with CUNIT1 and CTYPE1': written(rng.normal(size=2000), CTYPE1='WAVE', CUNIT1='Angstrom'),
}
for path in sys.argv[1:]:
    with open(path, 'rb') as file:
        cases[path.split('/')[-1]] = file.read()
print(json.dumps([record(name, raw) for name, raw in cases.items()]))
