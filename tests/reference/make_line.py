#!/usr/bin/env python3
"""Reference figures for the statics of a line: field, uniform line, taper, stepped line, as-built and envelope.

Shares nothing with the engine: potentials stand as they are (no factoring) at 40 digits, balance radii and
ends come from bisection, masses and stretches from tanh-sinh quadrature of the plain integrands, tensions from
antiderivatives as they stand (and in case D1 from SciPy's steps), greatest stresses from a search along the line. Lines are drawn at random over the whole permitted range
(seeded), and some extremes by hand. Every input is a double, and the reference starts from the same doubles.

    python3 tests/reference/make_line.py

writes tests/reference/data/line.json in a minute or two. Needs python3-mpmath and python3-scipy.
"""
import json
import sys
from pathlib import Path

HERE = Path(__file__).parent
sys.path.insert(0, str(HERE / "line"))

from hanging import as_built_case, d1_by_steps, envelope_case
from sizing import designs, field_case, random_stepped, stepped_case, taper_case, uniform_case

if __name__ == "__main__":
    everything = dict(
        field=[field_case() for _ in range(60)],
        uniform=[uniform_case() for _ in range(50)],
        taper=[taper_case(*design) for design in designs()],
        stepped=[case for _ in range(70) if (case := stepped_case(*random_stepped()))],
        asBuilt=[as_built_case() for _ in range(40)],
        envelope=[envelope_case() for _ in range(20)],
        d1=[d1_by_steps()],
    )
    (HERE / "data" / "line.json").write_text(json.dumps(everything, separators=(",", ":")) + "\n")
    print({name: len(cases) for name, cases in everything.items()})
