"""Times ecCodes unpacking a BUFR file and reading nine arrays of it; prints milliseconds of each try as JSON.

Usage: /usr/bin/python3 read-nine-arrays.py FILE CELLS
"""
import json
import sys
import time

import eccodes

KEYS = [
    'latitude', 'longitude', 'crossTrackCellNumber', 'windVectorCellQuality', 'indexOfSelectedWindVector',
    '#1#windSpeedAt10M', '#1#windDirectionAt10M', '#1#backscatter', '#1#antennaBeamAzimuth',
]


def read(path):
    cells = 0
    with open(path, 'rb') as file:
        while (handle := eccodes.codes_bufr_new_from_file(file)) is not None:
            eccodes.codes_set(handle, 'unpack', 1)
            arrays = [eccodes.codes_get_array(handle, key) for key in KEYS]
            cells += len(arrays[0])
            eccodes.codes_release(handle)
    return cells


def main():
    path, cells = sys.argv[1], int(sys.argv[2])
    tries = []
    for number in range(8):
        start = time.perf_counter()
        if read(path) != cells:
            sys.exit('the orbit was not read whole')
        tries.append((time.perf_counter() - start) * 1000)
    print(json.dumps(tries[1:]))


main()
