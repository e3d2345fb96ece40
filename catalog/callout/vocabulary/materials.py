"""Words for what the wire is made of. Numbers and symbols of alloys are read by their form, not from this list."""
# ruff: noqa: E501

MATERIALS: dict[str, str] = {
    "stainless": (
        "stainless, edelstahlgewebe, edelstahldraht, edelstahldrahtgewebe, stainless steel, ss, sst, sts, s/s, stnls, stainl, stainless stl, st stl, s steel, cres, corrosion resistant steel, inox, acier inox, acier inoxydable, inoxydable,"
        " edelstahl, rostfrei, rostfreier stahl, rostfr, nichtrostend, nichtrostender stahl, acero inoxidable, inoxidable, ac inox, acciaio inox, acciaio inossidabile, inossidabile, rvs, нержавеющая,"
        " нержавейка, нерж, s s"
    ),
    "CS": (
        "steel, stl, carbon steel, plain steel, mild steel, low carbon steel, low carbon, bright steel, black steel, iron, plain iron, black iron, cs, lcs, ls, stahl, stahldraht,"
        " eisen, eisendraht, acier, acier doux, fer, acero, acero al carbono, hierro, acciaio, ferro, acciaio al carbonio, unalloyed steel, staal, сталь, plain carbon steel, low-carbon steel, mild bright iron"
    ),
    "HCS": (
        "high carbon, high-carbon, hi-carbon, hi carbon, hicarbon, high carbon steel, high-carbon steel, hc, hcs, hc steel, spring steel, federstahl, oil tempered, oil tempered steel, high tensile, high tensile steel,"
        " ht steel, hts, hochgekohlt, acier a ressort, acier haut carbone, acero de muelles, acciaio armonico, spring federstahldraht, manganese steel, hi-tensile, hi tensile"
    ),
    "brass": "brass, brs, messinggewebe, messing, ms, laiton, laton, ottone, латунь, messingdraht",
    "bronze": "bronze, brz, bronzegewebe, bronce, bronzo, bronzedraht",
    "phosphor bronze": (
        "phosphor bronze, phos bronze, phosphorus bronze, ph bronze, phos brz, ph brz, phosbronze, ph br, phosphor brz, pb wire, p bronze, zinnbronze, phosphorbronze, bronze phosphoreux,"
        " bronce fosforoso, bronzo fosforoso, phosphorous bronze, phos bz, фосфористая бронза, tin bronze"
    ),
    "copper": "copper, cu, kupfergewebe, kupfer, cuivre, cobre, rame, медь, kupferdraht, cop",
    "aluminium": "aluminium, aluminum, alum, alu, al, alloy aluminium, aluminio, alluminio, алюминий",
    "nickel": "nickel, ni, pure nickel, reinnickel, niquel, nichel, никель",
    "titanium": "titanium, titan, titane, titanio, титан",
    "molybdenum": "molybdenum, moly, molybdan, molybdene, molibdeno",
    "tungsten": "tungsten, wolfram, tungstene, wolframio, tungsteno",
    "nickel-copper": "nickel copper, nickel-copper, nickel copper alloy, nickel-copper alloy",
    "duplex": "duplex, duplex stainless, duplex steel, super duplex",
    "silver": "silver, silber, argent, plata, argento",
}

OPEN_GRADES: dict[str, str] = {
    "stainless": "Which stainless: 304 (1.4301), 316 (1.4401), 316L (1.4404) or another?",
    "brass": "Which brass: CuZn30 (70/30), CuZn20 (80/20) or another?",
    "bronze": "Which bronze: a phosphor bronze (CuSn5, CuSn6) or a brass called bronze (CuZn10)?",
    "phosphor bronze": "Which phosphor bronze: CuSn5 or CuSn6?",
    "aluminium": "Which aluminium: 1350, 5056 or another?",
    "nickel": "Which nickel: 200 or 201?",
    "titanium": "Which titanium: grade 1 or grade 2?",
    "nickel-copper": "Which nickel-copper alloy: alloy 400 (N04400, 2.4360) or another?",
    "duplex": "Which duplex: 2205 (1.4462) or another?",
    "silver": "Which silver?",
}
"""A family's name alone → the question that it leaves."""

CLOSED: dict[str, str] = {"CS": "CS", "HCS": "HCS", "copper": "Cu-ETP", "molybdenum": "Mo", "tungsten": "W"}
"""A name that is one row of the alloy table."""
FAMILIES: dict[str, str] = {
    "CuZn": "brass", "CuSn": "phosphor bronze", "Al": "aluminium", "Ni2": "nickel", "Ti": "titanium", "Cu-": "copper", "400": "nickel-copper",
    "2205": "duplex", "Mo": "molybdenum", "CS": "CS", "GALV": "CS", "HCS": "HCS", "65Mn": "HCS", "W": "tungsten",
}  # fmt: skip
"""Beginning of an alloy's id → the family whose bare name agrees with it; all other numbers are stainless or nickel alloys."""

ZINC_NEEDS = ("CS", "HCS", None)
"""What galvanising goes with."""

BRASS_SPLITS: dict[tuple[int, int], str] = {
    (70, 30): "CuZn30",
    (80, 20): "CuZn20",
    (90, 10): "CuZn10",
    (85, 15): "CuZn15",
    (63, 37): "CuZn37",
    (65, 35): "CuZn35",
}
"""Copper and zinc in a brass's name."""
BARE_NUMBERS = frozenset({301, 302, 303, 304, 305, 309, 310, 314, 316, 317, 321, 347, 409, 410, 420, 430, 434, 904})
"""Three-digit numbers that name a stainless steel and could be a count all the same."""
