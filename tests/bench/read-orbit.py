"""Times the netCDF C library reading the arrays of an orbit, masked and scaled; prints the milliseconds.

The first reading of a fresh process, without the start of Python and its imports.
Usage: /usr/bin/python3 read-orbit.py FILE CELLS NAME...
"""
import sys
import time

import netCDF4


def main():
    path, cells, names = sys.argv[1], int(sys.argv[2]), sys.argv[3:]
    start = time.perf_counter()
    with netCDF4.Dataset(path) as file:
        file.set_auto_maskandscale(True)
        arrays = [file.variables[name][:] for name in names]
    took = (time.perf_counter() - start) * 1000
    if any(array.size != cells for array in arrays):
        sys.exit('the orbit was not read whole')
    print(took)


main()
