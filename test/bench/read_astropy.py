"""CPU seconds and peak memory (MB) that astropy takes to read a table; argument: file."""
import resource
import sys
import time

from astropy.table import Table

begun = time.process_time()
table = Table.read(sys.argv[1], format="ascii.fast_csv")
print(time.process_time() - begun, resource.getrusage(resource.RUSAGE_SELF).ru_maxrss / 1024)
