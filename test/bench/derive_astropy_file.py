"""CPU seconds that astropy takes to read a table, derive its quantities and write them; arguments: input, output."""
import sys
import time

begun = time.process_time()
import astropy.units as u
from astropy.coordinates import CartesianDifferential, Galactocentric, ICRS, SkyCoord
from astropy.table import Table
import numpy as np

t = Table.read(sys.argv[1], format="ascii.fast_csv")
frame = Galactocentric(
    galcen_coord=ICRS(ra=266.4051 * u.deg, dec=-28.936175 * u.deg), galcen_distance=8.122 * u.kpc,
    z_sun=20.8 * u.pc, galcen_v_sun=CartesianDifferential([12.9, 245.6, 7.78] * u.km / u.s),
)
sky = SkyCoord(
    ra=t["ra"] * u.deg, dec=t["dec"] * u.deg, distance=t["distance"] * u.kpc, pm_ra_cosdec=t["pmra"] * u.mas / u.yr,
    pm_dec=t["pmdec"] * u.mas / u.yr, radial_velocity=t["rv"] * u.km / u.s,
)
there = sky.transform_to(frame)
x, y, z = there.cartesian.xyz.to_value(u.kpc)
vx, vy, vz = there.velocity.d_xyz.to_value(u.km / u.s)
big_r, r, speed = np.hypot(x, y), np.sqrt(x**2 + y**2 + z**2), np.sqrt(vx**2 + vy**2 + vz**2)
v_cyl_r, v_phi, v_r = (x * vx + y * vy) / big_r, (y * vx - x * vy) / big_r, (x * vx + y * vy + z * vz) / r
v_theta = (z * v_cyl_r - big_r * vz) / r
lx, ly, lz = y * vz - z * vy, z * vx - x * vz, x * vy - y * vx
columns = {
    "gal_l": sky.galactic.l.deg, "gal_b": sky.galactic.b.deg, "x": x, "y": y, "z": z, "cyl_r": big_r, "r": r, "v_x": vx,
    "v_y": vy, "v_z": vz, "v_cyl_r": v_cyl_r, "v_phi": v_phi, "v_r": v_r, "v_theta": v_theta,
    "v_t": np.hypot(v_theta, v_phi), "speed": speed, "toomre_speed": np.sqrt(v_cyl_r**2 + (v_phi - 233.4) ** 2 + vz**2),
    "l_x": lx, "l_y": ly, "l_z": -lz, "l_tot": np.sqrt(lx**2 + ly**2 + lz**2),
    "pole_l": np.degrees(np.arctan2(ly, lx)) % 360, "pole_b": np.degrees(np.arctan2(lz, np.hypot(lx, ly))),
}
for name, values in columns.items():
    t[name] = values
t.write(sys.argv[2], format="ascii.fast_csv", overwrite=True)
print(time.process_time() - begun)
