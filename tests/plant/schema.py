#!/usr/bin/env python3
# Validates example plants and freshly written ones against the schema, and sees that it refuses wrong ones.
# SPDX-License-Identifier: GPL-3.0-or-later
import copy, json, pathlib, subprocess, sys, tempfile

try:
    import jsonschema
except ImportError:
    print('python3-jsonschema is not installed: skipped')
    sys.exit(77)

program, schema_file, examples = sys.argv[1], pathlib.Path(sys.argv[2]), pathlib.Path(sys.argv[3])
schema = json.loads(schema_file.read_text(encoding='utf-8'))
Validator = getattr(jsonschema, 'Draft202012Validator', None)
if Validator is None:
    print('this python3-jsonschema does not know draft 2020-12: skipped')
    sys.exit(77)
Validator.check_schema(schema)
validator = Validator(schema)


def errors(plant):
    return [f'{"/".join(map(str, e.absolute_path))}: {e.message[:200]}' for e in validator.iter_errors(plant)]


bad = 0
with tempfile.TemporaryDirectory() as folder:
    subprocess.run([program, '--plants', folder], check=True)
    files = sorted(pathlib.Path(folder).glob('*.heatloom')) + sorted(examples.glob('*.heatloom'))
    assert len(files) >= 2
    for file in files:
        found = errors(json.loads(file.read_text(encoding='utf-8')))
        print(f'{file.name}: {"valid" if not found else found}')
        bad += bool(found)
    loop = json.loads((pathlib.Path(folder) / 'loop.heatloom').read_text(encoding='utf-8'))


def spoil(path, value):
    plant = copy.deepcopy(loop)
    at = plant
    for step in path[:-1]:
        at = at[step]
    if value is None:
        del at[path[-1]]
    else:
        at[path[-1]] = value
    return plant


# What the program refuses in a file and a schema can see.
for path, value in [(['heatloom'], None), (['heatloom'], 2), (['units'], 'imperial'), (['components', 0, 'kind'], 'teapot'),
                    (['components', 0, 'id'], None), (['components', 1, 'extractions'], 9), (['components', 1, 'expansion'], 'crooked'),
                    (['components', 1, 'given', 'inlet.q'], 1.0), (['components', 1, 'given', 'extraction9.p'], 1e5),
                    (['components', 1, 'given', 'isentropic_efficiency'], 1.4), (['components', 1, 'given', 'inlet.p'], 0),
                    (['components', 1, 'given', 'inlet.p'], '65 bar'), (['streams', 0, 'from'], 'B1'), (['streams', 0, 'given'], {'q': 1}),
                    (['components', 0, 'at'], [1]), (['components', 0, 'turn'], 4), (['shafts', 0, 'joins'], []),
                    (['variants', 0, 'name'], ''), (['variants', 0, 'changes'], [{}]), (['variants', 0, 'changes'], [{'set': 'T1.p'}]),
                    (['variants', 0, 'changes'], [{'remove': 'T1', 'add': {'id': 'T1'}}]), (['variants', 0, 'changes'], [{'add': 'T1'}]),
                    (['plant', 'given', 'net_glory'], 1.0), (['streams', 3, 'tied', 'm'], 0.9), (['site', 'altitude'], 60000)]:
    if not errors(spoil(path, value)):
        print(f'not refused: {path} = {value}')
        bad += 1
sys.exit(1 if bad else 0)
