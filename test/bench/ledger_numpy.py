"""Milliseconds that numpy takes to judge a moved limit, combine six masks and count; arguments: rows, steps."""
import sys
import time

import numpy as np

rng = np.random.default_rng(1)
n = int(sys.argv[1])
feh, sigma = rng.normal(-1.4, 0.5, n), np.full(n, 0.1)
others = [rng.random(n) < 0.7 for _ in range(5)]
def step(limit):
    sure, passes, possible = feh + sigma <= limit, feh <= limit, feh - sigma <= limit
    unknown = np.isnan(feh)
    for mask in others:
        sure, passes, possible = sure & mask, passes & mask, possible & mask
    verdict = np.where(sure, 0, np.where(~possible, 2, np.where(unknown, 3, 1))).astype(np.uint8)
    masks = [feh <= limit] + others
    fails = np.zeros(n, np.uint8)
    for mask in masks:
        fails += ~mask
    left, table = np.ones(n, bool), []
    for mask in masks:
        left = left & mask
        table.append((left.sum(), (~mask).sum(), (~mask & (fails == 1)).sum()))
    return verdict, np.bincount(verdict, minlength=4), table
times = []
for i in range(int(sys.argv[2])):
    start = time.perf_counter(); step(-1 - 0.001 * i); times.append(time.perf_counter() - start)
print(sorted(times)[int(sys.argv[2]) // 2] * 1000)
