"""Prints the versions that a bench ran with."""
import json
import platform

import numpy
import scipy

print(json.dumps({'python': platform.python_version(), 'numpy': numpy.__version__, 'scipy': scipy.__version__}))
