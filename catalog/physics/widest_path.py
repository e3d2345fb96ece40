"""Largest rigid sphere through a Dutch weave: the widest path from face to face, found between two bounds.

The path that is widest by the boxes' upper bounds shows a sphere that certainly can't pass; a path whose
straight steps keep a clearance shows one that certainly can. Boxes on both paths are halved where they decide,
until the bounds are close: they enclose the answer of the model at every moment.
"""

from collections.abc import Callable
from heapq import heappop, heappush
from itertools import pairwise
from math import inf

from catalog.physics.dutch_wires import DutchWeave
from catalog.physics.passage import Box, Passage

LEVELS = 24
COARSE = 0.6
"""A box on the safe path is halved while its half diagonal exceeds this share of the gap between the bounds."""


def sphere_bounds_mm(weave: DutchWeave, share: float, most_boxes: int) -> tuple[float, float]:
    """Least and greatest diameter that the largest sphere can have, mm; 0, 0 where the weave is closed.

    Ends when half their distance is within *share* of their mean, or when *most_boxes* are held. What the
    straight pieces in place of arcs can be off by is inside the bounds.
    """
    passage, slack = Passage(weave), weave.chord_error_mm
    least, most = 0.0, inf
    steps: list[tuple[float, Box, Box]] = []
    while len(passage.boxes) < most_boxes:
        most, blocked = widest_path(passage, lambda box: passage.boxes[box].most_mm, least)
        if most + slack <= 0.0:
            return 0.0, 0.0
        if not steps or any(box not in passage.boxes for _, *pair in steps for box in pair):
            _, clear = widest_path(passage, lambda box: passage.boxes[box].centre_mm)
            steps = [(passage.least_between(a, b), a, b) for a, b in pairwise(clear)]
            least = max(least, min(steps)[0])
        if most - least + 2.0 * slack <= share * (most + least):
            break
        target = (most * (1.0 - share) + 2.0 * slack) / (1.0 + share)
        _refine(passage, blocked, steps, most, target, least)
    return 2.0 * max(least - slack, 0.0), 2.0 * (most + slack)


def _refine(
    passage: Passage,
    blocked: list[Box],
    steps: list[tuple[float, Box, Box]],
    most: float,
    target: float,
    least: float,
) -> None:
    """Halve what keeps the bounds apart: unsure boxes on the one path, the narrowest steps of the other."""
    todo = {box for box in blocked if passage.boxes[box].least_mm < target}
    narrow = min(steps)[0]
    limit = min(target, narrow + (target - narrow) / 4.0)
    tight = {box for width, *pair in steps if width < limit for box in pair}
    todo |= {box for box in tight if passage.half_diagonal_mm(box) > COARSE * (most - least)}
    for box in todo:
        if box[0] < LEVELS:
            passage.halve(box)


def widest_path(passage: Passage, width: Callable[[Box], float], known: float = -inf) -> tuple[float, list[Box]]:
    """Path from top to bottom whose narrowest box is as wide as can be: that width, mm, and the boxes.

    Boxes are visited from the widest down; equal ways continue through the roomiest box. Boxes narrower than
    *known*, which some path is known to keep, are left out.
    """
    came: dict[Box, Box] = {}
    queue: list[tuple[float, float, Box, Box]] = []
    for box in passage.boxes:
        if passage.is_top(box):
            heappush(queue, (-width(box), -width(box), box, box))
    while queue:
        tight, _, box, origin = heappop(queue)
        if box in came:
            continue
        came[box] = origin
        if box[3] == 0:
            return -tight, _trace(came, box)
        for other in passage.neighbours(box):
            own = -width(other)
            if other not in came and own <= -known:
                heappush(queue, (max(tight, own), own, other, box))
    raise AssertionError("the boxes always connect both faces")


def _trace(came: dict[Box, Box], box: Box) -> list[Box]:
    path = [box]
    while came[path[-1]] != path[-1]:
        path.append(came[path[-1]])
    return path
