"""A verdict as a sign and as words; the same on every face, and never by colour alone."""

from catalog.search.candidate import Candidate, Verdict

SIGNS = {
    Verdict.SAME: "=",
    Verdict.INTERCHANGEABLE: "~",
    Verdict.NEAR_SAFE: "+",
    Verdict.NEAR_RISK: "!",
    Verdict.CANNOT_SAY: "?",
    Verdict.NOT_EQUIVALENT: "x",
}
WORDS = {
    Verdict.SAME: "same",
    Verdict.INTERCHANGEABLE: "interchangeable",
    Verdict.NEAR_SAFE: "near, safe side",
    Verdict.NEAR_RISK: "near, risk side",
    Verdict.CANNOT_SAY: "cannot say",
    Verdict.NOT_EQUIVALENT: "not equivalent",
}


def verdict_sign(verdict: Verdict) -> str:
    """One ASCII character."""
    return SIGNS[verdict]


def verdict_words(candidate: Candidate) -> str:
    """'interchangeable, harm side: measure the roll', 'near, safe side, turned', …"""
    parts = [WORDS[candidate.verdict]]
    if candidate.harm_side and candidate.verdict is Verdict.INTERCHANGEABLE:
        parts.append("harm side: measure the roll")
    if candidate.turned:
        parts.append("turned 90°")
    return ", ".join(parts)
