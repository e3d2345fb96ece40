"""From claims to an understanding: every reading, what can't be woven, what contradicts itself, one question."""
