"""Galactocentric values of random rows in a named solar frame, with Debian's astropy, as JSON."""
import json
import sys
import warnings

import astropy.units as u
from astropy.coordinates import CartesianDifferential, Galactocentric, ICRS, SkyCoord
import numpy as np

warnings.simplefilter("error")
task = json.load(sys.stdin)
ra, dec, dist, pmra, pmdec, vlos = (np.array(column) for column in task["seen"])
frame = Galactocentric(
    galcen_coord=ICRS(ra=266.4051 * u.deg, dec=-28.936175 * u.deg),
    galcen_distance=task["r0"] * u.kpc,
    z_sun=task["zsun"] * u.pc,
    galcen_v_sun=CartesianDifferential(task["vsun"] * u.km / u.s),
)
sky = SkyCoord(
    ra=ra * u.deg, dec=dec * u.deg, distance=dist * u.kpc,
    pm_ra_cosdec=pmra * u.mas / u.yr, pm_dec=pmdec * u.mas / u.yr, radial_velocity=vlos * u.km / u.s,
)
there = sky.transform_to(frame)
position = there.cartesian.xyz.to_value(u.kpc)
velocity = there.velocity.d_xyz.to_value(u.km / u.s)
momentum = np.cross(position.T, velocity.T).T
r = np.linalg.norm(position, axis=0)
rho = np.hypot(position[0], position[1])
galactic = sky.galactic
json.dump(
    {
        "position": position.tolist(),
        "velocity": velocity.tolist(),
        "momentum": momentum.tolist(),
        "v_r": ((position * velocity).sum(axis=0) / r).tolist(),
        "v_phi": (-momentum[2] / rho).tolist(),
        "gal_l": galactic.l.deg.tolist(),
        "gal_b": galactic.b.deg.tolist(),
    },
    sys.stdout,
)
