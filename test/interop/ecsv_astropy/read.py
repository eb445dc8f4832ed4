"""Reads an ECSV file with astropy, warnings as errors, and prints what it found as JSON."""

import json
import sys
import warnings

warnings.simplefilter("error")
from astropy.table import Table  # noqa: E402


def cell(value, masked):
    if masked:
        return None
    return value.item().hex() if hasattr(value, "dtype") and value.dtype.kind == "f" else str(value)


table = Table.read(sys.argv[1], format="ascii.ecsv")
columns = []
for name in table.colnames:
    column = table[name]
    mask = getattr(column, "mask", [False] * len(column))
    columns.append(
        {
            "name": name,
            "kind": column.dtype.kind,
            "unit": None if column.unit is None else column.unit.to_string(),
            "dimension": None if column.unit is None else str(column.unit.physical_type),
            "description": column.description,
            "ucd": column.meta.get("ucd"),
            "cells": [cell(value, masked) for value, masked in zip(column, mask)],
        }
    )
json.dump({"meta": dict(table.meta), "columns": columns}, sys.stdout)
