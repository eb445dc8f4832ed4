"""CPU seconds that astropy takes for the quantities of `derive`: its own frames and representations, numpy for the rest.

Arguments: rows, rounds. One line a round.
"""
import sys
import time

import astropy.units as u
from astropy.coordinates import CartesianDifferential, Galactocentric, ICRS, SkyCoord
import numpy as np

n, rounds = int(sys.argv[1]), int(sys.argv[2])
rng = np.random.default_rng(1)
frame = Galactocentric(
    galcen_coord=ICRS(ra=266.4051 * u.deg, dec=-28.936175 * u.deg), galcen_distance=8.122 * u.kpc,
    z_sun=20.8 * u.pc, galcen_v_sun=CartesianDifferential([12.9, 245.6, 7.78] * u.km / u.s),
)
for _ in range(rounds):
    sky = SkyCoord(
        ra=rng.uniform(0, 360, n) * u.deg, dec=np.degrees(np.arcsin(rng.uniform(-1, 1, n))) * u.deg,
        distance=rng.uniform(1, 100, n) * u.kpc, pm_ra_cosdec=rng.normal(0, 3, n) * u.mas / u.yr,
        pm_dec=rng.normal(0, 3, n) * u.mas / u.yr, radial_velocity=rng.normal(0, 150, n) * u.km / u.s,
    )
    begun = time.process_time()
    there = sky.transform_to(frame)
    position = there.cartesian.xyz.to_value(u.kpc)
    velocity = there.velocity.d_xyz.to_value(u.km / u.s)
    around = there.represent_as("cylindrical")
    moving = around.differentials["s"]
    v_cyl_r = moving.d_rho.to_value(u.km / u.s)
    v_phi = -(around.rho * moving.d_phi).to_value(u.km / u.s, equivalencies=u.dimensionless_angles())
    ball = there.represent_as("spherical")
    spinning = ball.differentials["s"]
    r = ball.distance.to_value(u.kpc)
    v_r = spinning.d_distance.to_value(u.km / u.s)
    v_theta = -(ball.distance * spinning.d_lat).to_value(u.km / u.s, equivalencies=u.dimensionless_angles())
    v_t = np.hypot(v_theta, v_phi)
    speed = np.linalg.norm(velocity, axis=0)
    toomre_speed = np.sqrt(v_cyl_r**2 + (v_phi - 233.4) ** 2 + velocity[2] ** 2)
    momentum = np.cross(position.T, velocity.T)
    l_tot = np.linalg.norm(momentum, axis=1)
    pole_l = np.degrees(np.arctan2(momentum[:, 1], momentum[:, 0])) % 360
    pole_b = np.degrees(np.arctan2(momentum[:, 2], np.hypot(momentum[:, 0], momentum[:, 1])))
    galactic = sky.galactic
    l, b = galactic.l.deg, galactic.b.deg
    print(time.process_time() - begun)
