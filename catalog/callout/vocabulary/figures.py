"""Words that name a figure: what stands beside a number. Folded: lower case, no accents, no points."""
# ruff: noqa: E501

SLOTS: dict[str, str] = {
    "mesh": "mesh, meshes, msh, maglia, maglie, siebmaschen, malla, mallas, paso, paso de malla",
    "count": (
        "count, counts, mesh count, per inch mesh, mesh per inch, meshes per inch, mesh/inch, mesh/in, wires per inch, wpi, mpi, epi,"
        " openings per inch, holes per inch, maschen, maschenzahl, maschen pro zoll, fadenzahl, thread count,"
        " number of wires, nombre de mailles, numero de mallas, numero de maglie, numero maglie, mallas por pulgada, mailles au pouce,"
        " mailles par pouce, maglie per pollice, maschen je zoll, maschen/zoll"
    ),
    "aperture": (
        "aperture, apertures, apert, apt, ap, opening, openings, opng, opg, opgs, open, clear, clear opening,"
        " clear openings, clear aperture, clear mesh, sq opg, sq opening, square opening, square openings,"
        " square aperture, nominal aperture, nominal opening, width of aperture,"
        " aperture width, opening size, aperture size, hole, holes, hole size, space, spacing clear, sieve opening,"
        " screen opening, light opening, pore, pores, sq hole, square hole, square holes,"
        " maschenweite, lichte maschenweite, lichte weite, mw, lw, nennmaschenweite, maschenoffnung, offnung, siebweite,"
        " maille, mailles, maille carree, mailles carrees, ouverture, ouverture de maille, vide de maille, vide, ouverture nominale, jour,"
        " luz, luz de malla, luz de la malla, luz malla, abertura, abertura de malla, apertura, apertura de malla, abertura de malha,"
        " luce, luce netta, luce maglia, luce di maglia, apertura maglia, apertura di maglia, apertura netta,"
        " maaswijdte, размер ячейки, ячейка, ячейки, яч, slot, slots, slotted, slotted opening, slot opening,"
        " oblong opening, oblong openings, rectangular opening, rectangular openings, slot width"
    ),
    "pitch": (
        "pitch, c/c, cc, c-c, c to c, ctc, o/c, oc, o c, on center, on centers, on centre, on centres, centres, centers, crs, ctrs,"
        " center to center, centre to centre, centre-to-centre, center-to-center, m/m, teilung, mittenabstand,"
        " pas, entraxe, entre axes, entre centros, passo, interasse, шаг"
    ),
    "wire": (
        "wire, wires, wire dia, wire diam, wire diameter, wire diameters, wire size, wire thickness, wire thk, wd dia,"
        " dia wire, diam wire, diameter wire, thick wire, thickness of wire,"
        " dia of wire, diameter of wire, round wire, dia, diam, diameter, diameters, wire ø, Ø wire, Ø, wire Ø, dia Ø,"
        " draht, drahte, drahtdurchmesser, drahtstarke, draht Ø, draht-Ø, drahtdicke, durchmesser, dd, drahtdm, dm, drahtdurchm,"
        " fil, fils, diametre, diametre du fil, diametre de fil, diametre fil, fil Ø, Ø fil, fil diametre,"
        " hilo, hilos, alambre, diametro, diametro de hilo, diametro del hilo, diametro de alambre, diametro alambre,"
        " diametro del alambre, hilo Ø, calibre de hilo,"
        " filo, fili, diametro filo, diametro del filo, filo Ø, Ø filo, draad, draaddikte, проволока, проволоки, диаметр,"
        " диаметр проволоки, strand, kettdraht, kettdrahte, fil de chaine, schussdraht, schussdrahte, fil de trame, Ø draht, Ø hilo, thread, thread dia, wire rod"
    ),
    "open_area": (
        "open area, openarea, oa, free area, free open area, open area pct, percent open area, percentage open area, open screen area,"
        " freie siebflache, offene siebflache, offene flache, freie flache, surface libre, surface ouverte, taux de vide,"
        " % de vide, vide pct, area abierta, superficie abierta, area libera, superficie libera, vuoto per pieno, screening area,"
        " percent open, % open, % open area, % oa, % freie siebflache"
    ),
    "mass": (
        "wt, weight, mass, mass per area, unit weight, unit mass, gewicht, flachengewicht, masse, poids, poids au m2, peso,"
        " massa, вес, масса, weight per area"
    ),
    "width": (
        "width, widths, wide, wid, roll width, breite, breit, br, rollenbreite, largeur, laize, lze, de large, de ancho, ancho,"
        " anchura, de ancho, larghezza, largo, breedte, ширина"
    ),
    "length": (
        "length, long, lg, lgth, lng, roll length, lange, lang, rollenlange, longueur, de long, longitud, lunghezza,"
        " lungo, lengte, длина, lin m, linear"
    ),
    "thickness": "thickness, thk, thick, cloth thickness, gewebedicke, epaisseur, espesor, spessore, dicke",
}
"""Figure → the words for it. 'mesh' before or after a length may mean opening or pitch: it is never a plain count."""

SIDES: dict[str, str] = {
    "warp": "warp, warps, kette, kettdraht, kettdrahte, in kette, chaine, fil de chaine, urdimbre, ordito, основа",
    "weft": (
        "weft, wefts, shute, shoot, fill, filling, woof,"
        " schuss, schussdraht, schussdrahte, im schuss, trame, fil de trame, trama, уток"
    ),
}

UNITS: dict[str, str] = {
    "mm": "mm, mms, millimeter, millimeters, millimetre, millimetres, milimetros, millimetri, millimetres, мм",
    "um": "um, u, micron, microns, mic, mics, micrometer, micrometers, micrometre, micrometres, mikron, micra, micras, мкм",
    "in": "in, inch, inches, ins, inch's, zoll, pouce, pouces, pulg, pulgada, pulgadas, pollice, pollici, дюйм",
    "thou": "thou, thous, mil, mils, thousandths, thousandth",
    "cm": "cm, centimeter, centimeters, centimetre, centimetres, см",
    "m": "m, mtr, mtrs, mt, mts, meter, meters, metre, metres, lfm, lm, metros, metri, ml, м",
    "ft": "ft, feet, foot, lf, lin ft",
    "%": "%, pct, percent, per cent, prozent, pour cent",
    "kg/m2": "kg/m2, kg/qm, kg/sqm, kg per m2, kgs/m2, kg/mq, kgm2, kg m2, кг/м2",
    "g/m2": "g/m2, gsm, gr/m2, g/qm",
    "lb/ft2": "lb/ft2, lbs/ft2, lb/sq ft, lbs/sq ft, psf, lb/sqft, lbs/sqft, lbs per sq ft, lb per sq ft",
    "m2": "m2, qm, sqm, sq m, sq mtr, sq metres, square metres, square meters, mq, m²",
    "ft2": "ft2, sqft, sq ft, square feet",
    "/in": "/in, /inch, per inch, per in, je zoll, pro zoll, par pouce, au pouce, por pulgada, per pollice, per linear inch,"
    " to the inch, to an inch, per lin inch, per lineal inch, wires per inch, p inch, per one inch, /zoll, /pouce",
    "/cm": "/cm, per cm, je cm, pro cm, par cm, au cm, por cm, per centimetre, per centimeter, al cm, per linear cm, na cm, на см",
    "/in2": "/in2, per sq in, per square inch, per sq inch, /sq in, per in2, /sqin",
    "/cm2": "/cm2, per cm2, per sq cm, per square cm, /qcm, je cm2, pro cm2, par cm2, je qcm, pro qcm, /sq cm, /cm²",
}  # fmt: skip
"""Unit → its spellings, beside the signs ' and ″."""

GAUGES: dict[str, str] = {
    "SWG": "swg, iswg, imperial standard british standard british swg, uk swg, swg no",
    "BWG": "bwg, birmingham birmingham gauge, bwg no",
    "AWG": "awg, american awg no",
    "USSWG": "usswg, us steel us steel gauge, steel us stl wire ga, us swg, us steel wire ga, aswg",
    "MUSIC": "music mwg, music wire ga, piano",
    "STUBS": "stubs steel stubs steel gauge",
    "?": "ga, gauge, wire gauge, gage, gauges, gages, gge, gg, g, wg, wire ga, calibre, calibro, jauge, ga wire, gauge wire, gage wire",
}
"""Gauge system → its names; '?' is a number whose system nobody named."""
