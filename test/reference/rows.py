"""Writes reference rows: inputs are exact doubles, outputs decimal strings of 25 digits."""
import json
import os

import mpmath as mp

FOLDER = os.path.join(os.path.dirname(os.path.abspath(__file__)), "tables")


def write(name, how, rows):
    head = json.dumps({"source": f"mpmath {mp.__version__}, test/reference/{name}.py", "how": how})[:-1]
    text = head + ',\n"rows": [\n' + ",\n".join(json.dumps(row) for row in rows) + "\n]}\n"
    with open(os.path.join(FOLDER, name + ".json"), "w") as file:
        file.write(text)


def digits(x):
    return mp.nstr(x, 25)
