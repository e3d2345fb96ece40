"""Names that look like numbers: alloys, standards, certificates, dates, part numbers.

They are read before any number is, so that 1.4404 is no length, 3310-1 no count and 16-Mar no arithmetic.
"""

# ruff: noqa: E501
import re

from catalog.reference import alloys

EDGE = r"(?<![\w])"
END = r"(?![\w])"
MONTH = (
    r"(?:JAN(?:UARY?)?|FEB(?:RUARY?)?|MAR(?:CH|S)?|MÄRZ?|MRZ|APR(?:IL)?|MAY|MAI|JUN[EI]?|JUL[YI]?|AUG(?:UST)?|SEPT?(?:EMBER)?"
    r"|O[CK]T(?:OBER)?|NOV(?:EMBER)?|DE[CZ](?:EMBER)?)"
)

STANDARD = (
    r"(?:(?:DIN|EN|ISO|BS|NF|UNI|UNE|JIS|GOST|ГОСТ|IS)[ -]?){1,3}(?:EN[ -]|ISO[ -])?(?:X[ -]?)?[A-Z]?\d{3,5}(?:[-/]\d{1,4})*(?::\d{4})?"
    r"|ASTM[ -]?(?:E|A|B)[ -]?\d{2,4}(?:[-/]\d{2,4})?|E[ -]?11(?:[-:]\d{2,4})?(?![\d.])|E[ -]?2016(?:[-:]\d{2,4})?"
    r"|RR-W-360[A-Z]?(?:[ ,]+(?:TYPE|CL(?:ASS)?)\.?\s*(?:[IVX]+|\d)(?!\d))*|MIL-[A-Z]-\d+[A-Z]?"
)
CERTIFICATE = r"(?:DIN[ -]?)?(?:EN[ -]?)(?:ISO[ -]?)?10204(?:[-:]\d{4})?[ ,:/-]*(?:TYPE[ ]|TYP[ ])?(?P<cert1>[23][.,][12])[ABC]?|(?P<cert2>[23]\.[12])[ABC](?![\w.])"
DATE = rf"\d{{1,2}}[-.]{{1,2}}\s?{MONTH}(?:[-. ]\d{{2,4}})?{END}|{MONTH}[-. ]{{1,2}}\d{{1,2}}{END}(?![./,]\d)|\d{{4}}-\d\d-\d\d(?:[ T]00:00(?::00)?)?|\d{{1,2}}[./]\d{{1,2}}[./](?:19|20)\d\d"

PREFIX = r"(?:AISI|SAE|ASTM|TYPE|TYP|TP|TY|GRADE|GR|SS|S\.S\.|SST|SUS|INOX|RVS|ALLOY|T)"
STAINLESS = r"(?:20[1-5]|30[1-59]|31[0467]|321|347|409|410|416|420|43[014]|904|254)"
TAIL = r"(?:LN|LM|L|S|H|N|TI|CB|HQ|F|SE)?"
ALLOY = (
    rf"{PREFIX}[. ]?[ -]?{STAINLESS}{TAIL}(?:[ -]?(?:SS|SST))?"
    rf"|{STAINLESS}(?:L|S|LN|TI|HQ|H)(?:[ -]?(?:SS|SST))?|{STAINLESS}[ -]?(?:SS|SST|S/S)"
    r"|SU[SH]\s?\d{3}[A-Z\d]*|SUS\s?890L"
    r"|(?:W|WNR|W\.-?NR|WERKST|EN|DIN|MAT|NR|NO)?[. ]{0,2}[1-3]\.[0347]\d{3}(?:\s?\(?\s?X\d[A-Z\d-]*\)?)?"
    r"|(?:UNS[ -]?)?[SNCRAKG]\d{5}"
    r"|(?:EN[ -]?)?C[WR]\d{3}[A-Z]|EN[ -]?AW[ -]?\d{4}[A-Z]?|(?:AL|ALLOY|ALU|ALUMINI?UM)[ -]?(?:1350|5056|5154|6061|1050|1060|1100|5052)|(?:1350|5056)(?=\s?(?:AL|ALU|ALUM))"
    r"|X\d{1,3}(?:CR|NI|MO|CU|TI|NB|SI|N|AL|MN)[A-Z]*[\d-]*(?:[+][A-Z]+)?"
    r"|CU-?(?:ZN|SN)\s?\d{1,2}[A-Z]*(?:\d+)?|CU-?(?:ETP|OF|DHP)|NI-?CU\s?\d+[A-Z]*|NI-?CR\s?\d+[A-Z\d]*|NI-?MO\s?\d+[A-Z\d]*"
    r"|(?:ALLOY[ -]?)?C-?(?:276|22|4)(?![\d.])|65\s?MN|(?:ALLOY|NICKEL|NI)[ -]?(?:200|201|400|600|601|625|718|800|825|20)(?![\d.])"
    r"|(?:TITANIUM|TITAN|TI)[ -]?(?:GRADE|GR|G)?[. ]?[ -]?[1257](?![\d.])|(?:DUPLEX[ -]?)?S?2205|(?:SUPER[ -]?)?DUPLEX[ -]?2507|2205|2507"
    r"|\d{2}[ХX]\d{1,2}[НH]\d{0,2}[A-ZА-Я]*\d*[A-ZА-Я]*"
)
SPLIT = r"(?P<copper>60|63|65|67|70|72|80|85|90|95)\s?/\s?(?P<zinc>40|37|35|33|30|28|20|15|10|5)"
CODE = r"[A-Z\d]++(?:[.,]\d++)?(?:[-/][A-Z\d]++(?:[.,]\d++)?){2,40}"

DESIGNATION = re.compile(
    rf"{EDGE}(?:(?P<certificate>{CERTIFICATE})|(?P<date>{DATE})|(?P<standard>{STANDARD})"
    rf"|(?P<split>{SPLIT})(?=[ ,;]|$)|(?P<alloy>{ALLOY})){END}",
)
"""Matched against the text in capitals, letter for letter: see *capitals*."""
CODES = re.compile(rf"(?<!\S){CODE}(?=[,;]?(?:\s|$))")
MIXED_NUMBER = re.compile(r"\d{1,3}-\d{1,2}/\d{1,2}")
GOST_MESH = re.compile(r"(?:(?P<group>[123])-)?(?P<aperture>\d{1,3}(?:[.,]\d+)?)-(?P<wire>\d{1,3}(?:[.,]\d+)?)")


FAMILY_NUMBERS = (
    (re.compile(r"^(?:nickel|ni)[ -]?(?=20[01]$)", re.IGNORECASE), "Ni"),
    (re.compile(r"^(?:alumini?um|alu?|alloy|en[ -]?aw)[ -]?(?=(?:1350|5056)A?$)", re.IGNORECASE), "Al"),
    (re.compile(r"^ti(?:tan(?:ium)?)?[ -]?(?:grade|gr|g)?[. -]*(?=\d$)", re.IGNORECASE), "TiGr"),
    (re.compile(r"^(?:duplex[ -]?)?s?(?=2205$)", re.IGNORECASE), ""),
)
"""A family's name before a number, and how the table spells the two."""


def alloy_id(name: str) -> str:
    """The id of the alloy in the table, else the name as written, without what leads up to it."""
    spelled = name
    for family, meant in FAMILY_NUMBERS:
        spelled = family.sub(meant, spelled)
    bare = re.sub(r"\s?\(?\s?X\d.*$", "", name, flags=re.IGNORECASE)
    known = alloys.find(name) or alloys.find(spelled) or alloys.find(bare)
    if known:
        return known.id
    plain = re.sub(
        r"^(?:werkst|wnr|w\.-?nr|uns|aisi|type|typ|tp|sus|ss|sst|t|w)[. -]*(?=\d)", "", name, flags=re.IGNORECASE
    )
    return re.sub(r"[ -]?(?:SS|SST|S/S)$", "", plain, flags=re.IGNORECASE).strip(" .-").upper()


def capitals(text: str) -> str:
    """*text* in capitals, of the same length."""
    plain = text.upper()
    return plain if len(plain) == len(text) else "".join(c.upper() if len(c.upper()) == 1 else c for c in text)


def code_at(text: str, offset: int) -> re.Match[str] | None:
    """A part number at *offset*: fields joined by hyphens, some of them numbers, and no name that is known.

    'WM-316-100-0045-36' is somebody's scheme; '1-1/2' is a number, 'RR-W-360' a standard, 'lock-crimp' a word.
    """
    found = CODES.match(text, offset)
    if not found or MIXED_NUMBER.fullmatch(found.group()):
        return None
    fields = found.group().split("-")
    numbers = [field for field in fields if any(c.isdecimal() for c in field)]
    if len(fields) < 3 or len(numbers) < 2:
        return None
    named = DESIGNATION.match(text, offset)
    return None if named and named.end() >= found.end() else found
