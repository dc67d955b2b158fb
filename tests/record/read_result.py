"""Reads the sample answer's result file with h5py and its description with an XML parser; exits 1 at a difference.

usage: read_result.py LINE.h5 LINE.xdmf VERSION
"""
import os
import sys
import xml.etree.ElementTree as xml

import h5py
import numpy

NI, NJ = 6, 4


def expect(condition, what):
    if not condition:
        print("not as expected:", what)
        sys.exit(1)


def text(owner, name):
    value = owner.attrs[name]
    return value.decode() if isinstance(value, bytes) else str(value)


def ramp(shape, start, step):
    return (start + step * numpy.arange(numpy.prod(shape))).reshape(shape)


def check_hdf5(path, version):
    with h5py.File(path, "r") as file:
        expect(file.userblock_size == 512, "user block")
        expect(text(file, "format") == "leat result", "format")
        expect(file.attrs["format_version"] == 1, "format_version")
        expect(text(file, "writer") == "leat " + version, "writer")
        expect(text(file, "case_text") == "[passage] # ä", "case_text")
        expect(text(file, "outcome") == "out_of_budget", "outcome")
        expect(set(file) == {"mesh", "cells", "stations", "numbers", "history", "restart"}, "groups")
        check_fields(file)
        check_stations(file["stations"])
        check_numbers(file["numbers"])
        check_history(file["history"])
        for group in file.values():
            for name, array in group.items():
                expect(array.dtype in ("<f8", "<i4"), name + " type")
                expect("units" in array.attrs, name + " units")


def check_fields(file):
    points = file["mesh/points"][...]
    expect(points.shape == (NJ + 1, NI + 1, 3), "points shape")
    expect((points[:, :, 0] == 0.25 * numpy.arange(NI + 1)[None, :]).all(), "points x")
    expect((points[:, :, 1] == 0.001 * numpy.arange(NJ + 1)[:, None]).all(), "points y")
    expect((points[:, :, 2] == 0).all(), "points z")
    expected = {
        "cells/pressure": (ramp((NJ, NI), 1000, -0.1), "Pa"),
        "restart/pressure": (ramp((NJ, NI), 1000, -0.1), "Pa"),
        "restart/velocity_along": (ramp((NJ, NI + 1), 0.8, -0.0011), "m/s"),
        "restart/velocity_across": (ramp((NJ + 1, NI), -0.02, 0.0005), "m/s"),
    }
    for name, (values, unit) in expected.items():
        array = file[name]
        expect(array.shape == values.shape and numpy.allclose(array[...], values, rtol=1e-15, atol=1e-15), name)
        expect(text(array, "units") == unit and text(array, "long_name"), name + " attributes")
    velocity = file["cells/velocity"]
    expect(velocity.shape == (NJ, NI, 3) and text(velocity, "units") == "m/s", "velocity")
    expect(numpy.allclose(velocity[..., 0], ramp((NJ, NI), 0.9, -0.0013), rtol=1e-15), "velocity along")
    expect(numpy.allclose(velocity[..., 1], ramp((NJ, NI), -0.01, 0.0007), atol=1e-15), "velocity across")
    expect((velocity[..., 2] == 0).all(), "velocity, third component")


def check_stations(group):
    expect((group["x"][...] == [0, 0.75, 1.5]).all() and text(group["x"], "units") == "m", "stations x")
    mean = group["mean_pressure"]
    expect(numpy.isnan(mean[0]) and (mean[1:] == [4800.25, 0]).all(), "mean_pressure")
    expect(text(mean, "missing").startswith("NaN"), "missing")
    expect("wall_shear_inner" not in group, "a tube has no inner wall")


def check_numbers(group):
    drop = group["pressure_drop"]
    expect(drop.shape == () and drop[()] == 9623.25 and drop.attrs["band"] == 12.5, "pressure_drop")
    expect(drop.attrs["usable"] == 1 and text(drop, "reason") == "" and text(drop, "units") == "Pa", "its attributes")
    expect(text(drop, "meaning"), "meaning")
    power = group["pumping_power"]
    expect(power.attrs["usable"] == 0 and text(power, "reason") == "iterations were spent", "pumping_power")
    expect(numpy.isnan(power.attrs["band"]), "no band")
    absent = group["wall_shear_mean"]
    expect(numpy.isnan(absent[()]) and numpy.isnan(absent.attrs["band"]), "wall_shear_mean")
    expect(absent.attrs["usable"] == 0 and text(absent, "reason") == "no limit at a flat inlet", "its reason")


def check_history(group):
    expect(list(group["grid"]) == [0, 0, 1] and list(group["iteration"]) == [0, 1, 0], "history")
    expect(list(group["mass"]) == [1, 0.1, 0.01] and list(group["momentum"]) == [0.5, 0.25, 0.0625], "imbalances")


def dimensions(element):
    return tuple(int(word) for word in element.get("Dimensions").split())


def check_xdmf(path):
    root = xml.parse(path).getroot()
    grid = root.find("Domain/Grid")
    expect(grid.get("GridType") == "Uniform", "grid type")
    topology = grid.find("Topology")
    expect(topology.get("TopologyType") == "2DSMesh" and dimensions(topology) == (NJ + 1, NI + 1), "topology")
    expect(grid.find("Geometry").get("GeometryType") == "XYZ", "geometry")
    expect(len(grid.findall("Geometry/DataItem")) == 1, "one points array")
    attributes = {item.get("Name"): item for item in grid.findall("Attribute")}
    expect(set(attributes) == {"pressure", "velocity"}, "attributes")
    expect(all(item.get("Center") == "Cell" for item in attributes.values()), "centred on cells")
    expect(attributes["pressure"].get("AttributeType") == "Scalar", "pressure is a scalar")
    expect(attributes["velocity"].get("AttributeType") == "Vector", "velocity is a vector")
    items = list(root.iter("DataItem"))
    expect(len(items) == 3, "three arrays")
    for item in items:
        file_name, _, array_name = item.text.strip().partition(":")
        expect(os.path.basename(file_name) == file_name, "a bare file name: " + file_name)
        with h5py.File(os.path.join(os.path.dirname(path), file_name), "r") as file:
            expect(array_name in file, array_name + " exists")
            expect(file[array_name].shape == dimensions(item), array_name + " dimensions")
            expect(file[array_name].dtype.itemsize == int(item.get("Precision")), array_name + " precision")
        expect(item.get("Format") == "HDF" and item.get("NumberType") == "Float", array_name + " kind")


check_hdf5(sys.argv[1], sys.argv[3])
check_xdmf(sys.argv[2])
print("all as expected")
