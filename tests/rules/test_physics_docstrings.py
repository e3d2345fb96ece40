"""Every public formula of the physics says its units, its source and a check value, and its example runs."""

import doctest
import importlib
import inspect
import pkgutil
import re
from collections.abc import Callable
from types import FunctionType, ModuleType

import pytest

import catalog.physics

SOLVER = {"domain", "clearance", "passage", "dutch_wires", "widest_path"}
"""The numeric solver and the refusals: no formulas of the trade, so their docstrings follow the usual form."""
MODULES = [importlib.import_module(f"catalog.physics.{m.name}") for m in pkgutil.iter_modules(catalog.physics.__path__)]
FORMULAS = [
    pytest.param(thing, id=f"{module.__name__.rpartition('.')[2]}.{name}")
    for module in MODULES
    if module.__name__.rpartition(".")[2] not in SOLVER
    for name, thing in vars(module).items()
    if isinstance(thing, FunctionType) and thing.__module__ == module.__name__ and not name.startswith("_")
]
UNIT = re.compile(r"\[[^\]]+\]")


def faults(formula: Callable[..., object]) -> list[str]:
    """What the docstring of a formula lacks, in words."""
    text = inspect.cleandoc(formula.__doc__ or "")
    found = [f"parameter {name} has no unit" for name in inspect.signature(formula).parameters if not unit(text, name)]
    for heading in ("Returns:", "Raises:", "Valid:", "**Source**:", "**Check value**:"):
        if len(section(text, heading)) < 8:
            found.append(f"{heading} is missing or empty")
    if not UNIT.search(section(text, "Returns:")):
        found.append("the result has no unit")
    if "source:" not in section(text, "**Check value**:"):
        found.append("the check value doesn't say where it comes from")
    if ">>> " not in text:
        found.append("there is no example")
    return found


def unit(text: str, parameter: str) -> bool:
    """Whether the entry of a parameter, up to the next one, holds a unit in brackets."""
    entry = re.search(rf"^    {parameter}: (.*(?:\n        .*)*)", text, re.MULTILINE)
    return bool(entry and UNIT.search(entry.group(1)))


def section(text: str, heading: str) -> str:
    """The words under a heading, with its continuation lines."""
    found = re.search(rf"^{re.escape(heading)}(.*(?:\n    .*)*)", text, re.MULTILINE)
    return found.group(1).strip() if found else ""


@pytest.mark.parametrize("formula", FORMULAS)
def test_a_formula_states_units_source_and_a_sourced_check_value(formula: Callable[..., object]) -> None:
    assert not faults(formula)


def test_there_are_formulas_to_look_at() -> None:
    assert len(FORMULAS) > 35


@pytest.mark.parametrize("module", MODULES, ids=lambda m: m.__name__)
def test_the_examples_in_physics_run(module: ModuleType) -> None:
    assert doctest.testmod(module).failed == 0


@pytest.mark.parametrize("module", MODULES, ids=lambda m: m.__name__)
def test_every_public_thing_in_physics_has_a_docstring(module: ModuleType) -> None:
    own = [
        t for n, t in vars(module).items() if not n.startswith("_") and getattr(t, "__module__", "") == module.__name__
    ]
    assert module.__doc__
    assert not [t for t in own if isinstance(t, FunctionType | type) and not t.__doc__]


def silent(pitch_mm: float) -> float:
    """Count.

    Parameters:
        pitch_mm: distance of neighbours
    Returns: wires per inch. Scalars only.
    Raises: nothing at all.
    Valid: always and everywhere.
    **Check value**: 16.9 for 1.5 mm
    """
    return 25.4 / pitch_mm


def test_the_rule_finds_what_is_missing() -> None:
    assert faults(silent) == [
        "parameter pitch_mm has no unit",
        "**Source**: is missing or empty",
        "the result has no unit",
        "the check value doesn't say where it comes from",
        "there is no example",
    ]
