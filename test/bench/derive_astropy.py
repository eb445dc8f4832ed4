"""CPU seconds that astropy takes for the quantities of `derive` on n random rows (arguments: n)."""
import sys
import time

import astropy.units as u
from astropy.coordinates import CartesianDifferential, Galactocentric, ICRS, SkyCoord
import numpy as np

n = int(sys.argv[1])
rng = np.random.default_rng(1)
sky = SkyCoord(
    ra=rng.uniform(0, 360, n) * u.deg, dec=np.degrees(np.arcsin(rng.uniform(-1, 1, n))) * u.deg,
    distance=rng.uniform(1, 100, n) * u.kpc, pm_ra_cosdec=rng.normal(0, 3, n) * u.mas / u.yr,
    pm_dec=rng.normal(0, 3, n) * u.mas / u.yr, radial_velocity=rng.normal(0, 150, n) * u.km / u.s,
)
frame = Galactocentric(
    galcen_coord=ICRS(ra=266.4051 * u.deg, dec=-28.936175 * u.deg), galcen_distance=8.122 * u.kpc,
    z_sun=20.8 * u.pc, galcen_v_sun=CartesianDifferential([12.9, 245.6, 7.78] * u.km / u.s),
)
begun = time.process_time()
there = sky.transform_to(frame)
position = there.cartesian.xyz.to_value(u.kpc)
velocity = there.velocity.d_xyz.to_value(u.km / u.s)
momentum = np.cross(position.T, velocity.T)
there.represent_as("cylindrical")
there.represent_as("spherical")
r = np.linalg.norm(position, axis=0)
(position * velocity).sum(axis=0) / r
np.linalg.norm(momentum, axis=1)
np.linalg.norm(velocity, axis=0)
galactic = sky.galactic.l.deg
print(time.process_time() - begun)
