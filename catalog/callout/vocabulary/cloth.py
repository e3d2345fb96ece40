"""Words that say how a cloth is woven, crimped, finished and what it is called."""
# ruff: noqa: E501

WEAVES: dict[str, str] = {
    "plain": (
        "plain, plain weave, plain woven, pw, plain-weave, plain square weave, leinenbindung, leinwandbindung, leinwand, leinenb,"
        " glattgewebe, toile unie, armure toile, armure unie, tejido liso, ligamento liso, ligamento tafetan, tafetan, liso,"
        " tela liscia, armatura tela, armatura liscia, liscio, effen, полотняное, полотняного переплетения, over and under"
    ),
    "twilled": (
        "twill, twilled, twill weave, twilled weave, tw, 2/2 twill, 2/2 twilled, 2/2 twill weave, 2/2 twilled weave, twill 2/2, 2x2 twill, twill 2x2, twilled square weave,"
        " koperbindung, koeperbindung, koper, koeper, kopergewebe, croise, croisee, toile croisee, serge, armure croisee, armure serge, sarga, asargado, saia,"
        " diagonal, saglia, armatura saglia, a saglia, keper, саржевое, саржевого переплетения, twld"
    ),
    "reverse twilled": "reverse twill, reverse twilled, reversed twill, rev twill, broken twill, fischgrat, herringbone, zigzag twill",
    "plain-dutch": (
        "plain dutch, plain dutch weave, pdw, pd, plain dutch woven, plain hollander weave, dutch plain weave, dutch plain,"
        " plain dutch filter cloth, glatte tresse, tresse glatt, einfache tresse, leinentresse, reps lisse, reps uni, hollandais uni,"
        " holandes liso, reps liso, reps semplice, olandese semplice, hollandaise unie, plain filter weave"
    ),
    "twilled-dutch": (
        "twilled dutch, twill dutch, twilled dutch weave, twill dutch weave, tdw, dutch twill, dutch twilled, dutch twill weave,"
        " twilled dutch woven, dtw, koepertresse, kopertresse, tresse koper, tresse koeper, reps croise, hollandais croise,"
        " hollandaise croisee, holandes cruzado, holandes asargado, olandese saglia, twilled filter weave"
    ),
    "reverse-plain-dutch": (
        "reverse dutch, reverse plain dutch, reverse dutch weave, reverse plain dutch weave, rpd, rpdw, rdw, reversed dutch,"
        " reversed plain dutch, rev dutch, rev plain dutch, dutch reverse, panzertresse, inverse tresse, umgekehrte tresse, reps inverse,"
        " holandes inverso, holandes invertido, olandese inverso, olandese rovescio, hollandais inverse, reverse pdw"
    ),
    "reverse twilled dutch": (
        "reverse twilled dutch, reverse twill dutch, reverse dutch twilled, rtd, rtdw, reverse dutch twill, reverse tdw,"
        " double twilled dutch, five heddle, five heddle weave, 5 heddle, basket weave, mat weave"
    ),
    "dutch": "dutch, dutch weave, dutch woven, hollander weave, tresse, tressen, tressengewebe, reps, hollandais, hollandaise, holandes, olandese",
}
"""Weave → its names. 'dutch' alone doesn't say which; the reversed twills are recognised, not computed."""

FILTERS = (
    "filter cloth, filter weave, filter mesh, filtergewebe, filterscheibe, toile filtrante, tissu filtrant, tela filtrante,"
    " tejido filtrante, tela filtro, filtering cloth, filter media, filter screen, filter"
)

CRIMPS: dict[str, str] = {
    "lock crimp": "lock crimp, lock crimped, lockcrimp, lc",
    "double crimp": "double crimp, double crimped, dbl crimp, doppelt gekropft, dc, doppelt gewellt",
    "intermediate crimp": "intermediate crimp, intercrimp, inter crimp, intermediate crimped, int crimp, ic, intermed crimp",
    "flat top": "flat top, flat top crimp, flattop, flat-top, smooth top, ft crimp, einseitig glatt",
    "pre-crimped": "pre-crimped, precrimped, pre crimped, precrimp, crimped, vorgekropft, gekropft, wellengitter, pre-crimp, crimp",
    "plain crimp": "plain crimp, arch crimp, single crimp",
}

FINISHES: dict[str, str] = {
    "calendered": "calendered, calendared, calendered smooth, calandered, kalandriert, calandre, calandrado, calandrato, rolled flat, flattened",
    "sintered": "sintered, sintered mesh, diffusion bonded, gesintert, fritte, sinterizado, sinterizzato, laminated, laminate",
    "satin": "satin, satin weave, satin finish, atlasbindung, atlas, satine",
    "stranded": "stranded, stranded wire, multi strand, multistrand, stranded weave, litze, litzen, torons, twisted wire",
    "annealed": "annealed, bright annealed, soft annealed, ann, gegluht, weichgegluht, recuit, recocido, ricotto, black annealed, dead soft",
    "epoxy coated": "epoxy, epoxy coated, epoxy coating, epoxidbeschichtet, epox",
    "powder coated": "powder coated, powdercoated, pulverbeschichtet, polyester coated, powder coat",
    "PVC coated": "pvc coated, vinyl coated, pvc coating, plastic coated, kunststoffbeschichtet",
    "painted": "painted, lacquered, paint, lackiert, black painted, enamelled, varnished",
    "tinned": "tinned, tin plated, verzinnt, etame, estanado, stagnato",
    "nickel plated": "nickel plated, vernickelt, ni plated",
    "chrome plated": "chrome plated, verchromt",
    "electropolished": "electropolished, electro polished, ep, elektropoliert",
    "passivated": "passivated, pickled and passivated, gebeizt, pickled, passiviert",
    "degreased": "degreased, cleaned, ultrasonically cleaned, entfettet, oil free, degraisse",
    "blackened": "blackened, black oxide, bruniert",
    "charcoal": "charcoal, charcoal finish",
    "bright": "bright, blank, bright finish, mill finish",
    "black": "black, schwarz",
}

GALVANISED: dict[str, str] = {
    "galvanised before weaving": (
        "galvanised before weaving, galvanized before weaving, galv before weaving, gbw, hot dip galvanized before weaving,"
        " hot dip galvanised before weaving, hot dipped galvanized before weaving, galv before woven, vor dem weben verzinkt, zinc coated before weaving"
    ),
    "galvanised after weaving": (
        "galvanised after weaving, galvanized after weaving, galv after weaving, gaw, hot dip galvanized after weaving,"
        " hot dip galvanised after weaving, hot dipped galvanized after weaving, hot-dip galvanised after weaving, nach dem weben verzinkt,"
        " galv after woven, im stuck verzinkt, zinc coated after weaving"
    ),
    "galvanised": (
        "galvanised, galvanized, galv, galvd, galv'd, gal, galvanised steel, galvanized steel, galv steel, galv stl, gi, galvanised iron,"
        " galvanized iron, hot dip galvanized, hot dip galvanised, hot dipped galvanized, hot dipped galvanised, hdg, zinc coated, zinc plated,"
        " electro galvanized, electro galvanised, verzinkt, verz, feuerverzinkt, feuerverz, galvanise, acier galvanise, galvanizado, acero galvanizado,"
        " zincato, acciaio zincato, ferro zincato, gegalvaniseerd, verzinkter stahl, stahl verzinkt, оцинкованная, оцинк"
    ),
}
"""Zinc, and when it was put on: cloth coated after weaving opens less."""

GRADES: dict[str, str] = {
    "market grade": "market grade, market, mkt grade, market gr, mg, mkt gr, market grade mesh",
    "tensile bolting cloth": "tensile bolting cloth, tensile bolting, bolting cloth, bolting, bolting grade, tensile bolt cloth, tensile cloth",
    "mill grade": "mill grade, mill, mill gr",
    "TBC": "tbc",
    "milling grade": "milling grade, ultra fine grade, heavy grade, medium grade, light grade, extra heavy, superfine",
}
"""Grade → its names. TBC is bolting cloth or 'to be confirmed'."""

PRODUCTS = (
    "weave, wire cloth, wirecloth, wire-cloth, wire mesh, wiremesh, wire screen, wire screening, woven wire, woven wire cloth, woven wire mesh, woven mesh, woven,"
    " woven wire screen, woven cloth, cloth, screen, screens, screening, scrn, screen cloth, gauze, wire gauze, wire fabric,"
    " netting woven, fabric, metal cloth, metal fabric, metallic cloth, square, square weave, square woven, sq,"
    " sq weave, sqm weave, industrial wire cloth, space cloth, space screen, vibrating screen, strainer, strainer mesh, wire netting, cloth wire,"
    " insect screen, insect screening, fly screen, flyscreen, insect mesh, wire filter cloth, screen mesh, screen wire,"
    " drahtgewebe, gewebe, carre, carree, carres, carrees, cuadrada, cuadrado, quadra, quadrata, quadratisch, drahtsieb, metallgewebe, drahttuch, quadratgewebe, quadratmaschengewebe, quadratmaschen, siebboden,"
    " toile, toile metallique, toiles metalliques, toile tissee, tissu metallique, treillis, grillage tisse,"
    " tela metalica, tela, tejido, tejido metalico, malla tejida, malla metalica, malla de alambre, tejido de alambre,"
    " rete metallica, tela metallica, tessuto metallico, rete, tessuto, metaalgaas, gaas, сетка, сетка тканая, сетка проволочная, сетка проволочная тканая,"
    " wire cloth woven, rectangular, rectangular weave, oblong, broad,"
    " tamices, heavy duty, hd, rect"
)
"""What the goods are called; says nothing more of them."""

HARDWARE_CLOTH = "hardware cloth, hardwarecloth, hdwe cloth, hdw cloth, hardware mesh, hw cloth"

SIEVES = (
    "sieve, sieves, sieve cloth, sieving cloth, test sieve, test sieve cloth, test sieves, us std sieve, us standard sieve, us sieve,"
    " usa standard sieve, us std, uss, sieve size, us standard, standard sieve, std sieve, usa std, analytical sieve,"
    " prufsieb, prufsiebgewebe, analysensieb, siebgewebe, pruefsieb, tamis, toile de tamis, tamis de controle, toile a tamis, tamiz, tamiz de ensayo,"
    " malla de tamiz, setaccio, staccio, tela per staccio, staccio di prova, zeef, сито, u s sieve, u s std sieve, u s standard sieve, testing sieve"
)
"""Words that make a number a sieve designation, or let it be one."""

NUMBER_SIGNS = "no, nr, nos, number, num, n°, numero, nummer, номер"
