"""A plain part of the screen that holds others; its layout is the style sheet's business."""

from textual.widget import Widget


class Box(Widget):
    """Holds widgets. Brings no style of its own along, which spares the start a sheet to read."""
