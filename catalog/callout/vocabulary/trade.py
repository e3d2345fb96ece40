"""Words around the cloth: goods that aren't it, orders, sizes, limits, certificates, and words of courtesy."""
# ruff: noqa: E501

NOT_WOVEN: dict[str, str] = {
    "welded": (
        "welded, welded mesh, weld mesh, welded wire, welded wire mesh, weldedmesh, spot welded, electrowelded, welded panel, welded cloth, wwf, wwm,"
        " geschweisst, punktgeschweisst, geschweisstes gitter, schweissgitter, punktschweissgitter, soude, treillis soude, grillage soude, electrosoldada, soldada,"
        " soldado, malla electrosoldada, malla soldada, elettrosaldata, elettrosaldato, saldata, rete elettrosaldata, gelast, сварная, welded fabric"
    ),
    "knitted": "knitted, knit, knitted mesh, knitted wire mesh, gestrickt, gestrick, drahtgestrick, tricote, tejido de punto, maglia a maglia",
    "expanded": (
        "expanded, expanded metal, expanded mesh, exp metal, streckmetall, streckgitter, metal deploye, deploye, metal desplegado, desplegado, lamiera stirata,"
        " stirata, просечно-вытяжная, flattened expanded, raised expanded"
    ),
    "perforated": (
        "perforated, perforated metal, perforated plate, perforated sheet, perf, perf plate, perf sheet, punched plate, punch plate, punched, lochblech, tole perforee,"
        " perforee, chapa perforada, perforada, lamiera forata, forata, round hole plate, lochplatte, gelocht, rundgelocht, quadratgelocht"
    ),
    "wedge wire": "wedge wire, wedgewire, wedge-wire, profile wire, profile wire screen, spaltsieb, spaltrohr, vee wire, v-wire, v wire, slotted tube",
    "chain link": "chain link, chainlink, chain-link, diamond mesh fence, maschendraht, maschendrahtzaun, grillage simple torsion",
    "hexagonal netting": (
        "hexagonal, hex netting, hex mesh, chicken wire, poultry netting, poultry net, rabbit wire, sechseckgeflecht, rabbit netting, hexagonal netting, gabion"
    ),
    "electroformed": "electroformed, electroformed mesh, etched, photo etched, photoetched, electro-formed, laser drilled, laser cut holes",
    "grating": "grating, bar grating, gitterrost, caillebotis",
    "braided": "braided, braid, sleeve, wire rope, conveyor belt, spiral belt, metal foam, sponge, felt, fibre felt, fiber felt, sinter felt, foil",
}  # fmt: skip
"""What is made of metal but not woven."""

NOT_METAL = (
    "nylon, polyamide, polyamid, pa6, pa66, pa 6, pa 66, polyester, pet, pes, polypropylene, polypropylen, pp, polyethylene, hdpe, ldpe, pe, ptfe, pvdf, etfe, peek,"
    " fibreglass, fiberglass, glass fibre, glass fiber, glasfaser, glasgewebe, fibre de verre, fibra de vidrio, fibra di vetro, silk, seide, soie, seda, seta,"
    " cotton, baumwolle, coton, plastic, plastics, kunststoff, plastique, plastico, plastica, monofilament, multifilament, pvc, aramid, carbon fibre, carbon fiber,"
    " wool, paper, felted, linen cloth, canvas, rubber, polyurethane, pu, silicone, ceramic, textile, нейлон, капрон, полиэфир, poliester, poliammide, poliestere, poliamida"
)

REFERENCES = (
    "same as, same, as before, as last, last time, as usual, usual, the usual, repeat, repeat order, repeat of, reorder, re-order, like last, like before, as per last,"
    " wie gehabt, wie letztes mal, wie zuvor, wie ublich, comme la derniere fois, comme d'habitude, idem, dto, ditto, do, as previous, previous order, last order, as supplied,"
    " as above, same again, como siempre, come sempre, come al solito, as per sample, per sample, as sample, nach muster, see drawing, per drawing, per dwg, see dwg, laut zeichnung"
)
"""Words that point to something that isn't in the text."""

ALTERNATIVES = (
    "alt, alternate, alternative, alternatively, alternativ, or alternative, or alternatively, or, or else, oder, ou, ou bien, oppure, alternativa, ersatzweise, or equal,"
    " or equivalent, o, or similar, or near, or nearest, or eq, or equiv, equivalent, equiv"
)
EQUALS = "or equal, or equivalent, or similar, or near, or nearest, or eq, or equiv, equivalent, equiv, o equivalente, ou equivalent, oder gleichwertig, o simile, o similar"
"""'Or equal' offers no second cloth."""

FORMS: dict[str, str] = {
    "roll": "roll, rolls, rl, rls, rolle, rollen, rouleau, rouleaux, rollo, rollos, rotolo, rotoli, coil, coils, bobina, bobine, rol, рулон, full roll, full rolls",
    "piece": (
        "pc, pcs, piece, pieces, pce, pces, off, ea, each, stk, stck, stuck, stueck, st, pieza, piezas, pza, pzas, pezzo, pezzi, pz, morceau, morceaux, coupon, cut piece,"
        " cut pieces, blank, blanks, zuschnitt, zuschnitte, abschnitt, qty, quantity, quant, menge, quantite, cantidad, strip, strips, streifen, length of, cut to size, шт, lengths"
    ),
    "panel": "panel, panels, sheet, sheets, plate size, feld, felder, tafel, tafeln, panneau, panneaux, feuille, plaque, panelen, pannello, pannelli, hoja, lamina, deck, decks, sheet size, panel size, siebfeld",
    "disc": "disc, discs, disk, disks, circle, circles, ronde, ronden, rondelle, disque, disques, disco, discos, dischi, scheibe, scheiben, round, rounds, circular, диск",
}  # fmt: skip

CERTIFICATES = (
    "cert, certs, certificate, certificates, certified, certification, mill cert, mill certs, mill certificate, mtr, mtrs, mtc, material certificate, material cert, test certificate,"
    " inspection certificate, zeugnis, zeugnisse, prufzeugnis, abnahmeprufzeugnis, werkszeugnis, attest, apz, wz, certificat, certificado, certificato, en10204, en 10204, din en 10204, test report, 3.1b"
)

LEAST = (
    "min, minimum, mindestens, mind, at least, not less than, no less than, not under, not below, nlt, or more, or over, or larger, or greater, and up, and over, and above,"
    " minimal, au moins, au minimum, minimo, como minimo, al menos, almeno, non meno di, no menos de, pas moins de, nicht weniger als, nicht unter, minste, mini, mini., не менее, or bigger, or wider"
)
MOST = (
    "max, maximum, hochstens, at most, not more than, no more than, not over, not above, not exceeding, not to exceed, must not exceed, nmt, up to, or less, or under, or smaller,"
    " maximal, au plus, au maximum, maximo, como maximo, al massimo, massimo, non piu di, maxi, no mas de, pas plus de, nicht mehr als, nicht uber, bis zu, не более, or below, or narrower"
)
OVER = "more than, greater than, over, above, exceeding, larger than, bigger than, wider than, mehr als, grosser als, uber, plus de, superieur a, mas de, mayor que, piu di, maggiore di, ab"
UNDER = "less than, under, below, smaller than, narrower than, weniger als, kleiner als, unter, moins de, inferieur a, menos de, menor que, meno di, minore di"
NOT_LARGER = "not larger than, no larger than, not bigger than, no bigger than, not wider than, no wider than, not greater than, no greater than"
NOT_SMALLER = "not smaller than, no smaller than, not narrower than"
FINER = "finer than, finer, or finer, and finer, feiner als, oder feiner, plus fin que, mas fino que, piu fine di, closer than"
COARSER = "coarser than, coarser, or coarser, and coarser, grober als, oder grober, plus gros que, mas grueso que, opener than, more open than"
NOT_FINER = "not finer than, no finer than, nicht feiner als, pas plus fin que, no mas fino que, non piu fine di"
NOT_COARSER = "not coarser than, no coarser than, nicht grober als, pas plus gros que, non piu grossa di"
HEAVIER = "heavier than, thicker than, or heavier, or thicker, and heavier, and thicker, heavier, thicker, dicker als, oder dicker, starker als, stouter than, or stouter"
LIGHTER = "lighter than, thinner than, or lighter, or thinner, and lighter, lighter, thinner, dunner als, oder dunner, slimmer than"
NOT_HEAVIER = "not heavier than, no heavier than, not thicker than, no thicker than, nicht dicker als"
NOT_LIGHTER = "not lighter than, no lighter than, not thinner than, no thinner than, nicht dunner als"

COMPARISONS: dict[str, str] = {
    "least": LEAST, "most": MOST, "over": OVER, "under": UNDER, "not larger": NOT_LARGER, "not smaller": NOT_SMALLER,
    "finer": FINER, "coarser": COARSER, "not finer": NOT_FINER, "not coarser": NOT_COARSER,
    "heavier": HEAVIER, "lighter": LIGHTER, "not heavier": NOT_HEAVIER, "not lighter": NOT_LIGHTER,
}  # fmt: skip
"""Comparison → its words. Finer cloth has the higher count, a heavier gauge the lower number."""

PURPOSES: dict[str, str] = {
    "retain": (
        "retain, retains, retaining, to retain, must retain, hold back, holds back, stop, stops, ruckhalten, retenir, retener, trattenere, keeps out, keep out,"
        " retain particles, retaining particles, retention, to stop, retain particles of, retain solids"
    ),
    "pass": "pass, passes, passing, to pass, must pass, let through, lets through, durchlassen, laisser passer, dejar pasar",
}
RATINGS: dict[str, str] = {
    "nominal": "nominal, nom, nominal rating, nominal filtration, nominell, nominale, nominel",
    "absolute": "absolute, abs, absolute rating, absolut, absolue, absoluto, assoluto, absolute filtration",
    "unstated": "filter rating, rating, filtration rating, filterfeinheit, feinheit, finesse, micron rating, filtration, filtration fineness",
}
BAND = "passing, minus, undersize, retained on, held on, plus, oversize, retained, through"
RANGES = "to, thru, through, bis, until, until and including, up to and including, till"
BETWEEN = "between, from, zwischen, von, entre, fra, tra, range, within"
BY = "by, auf, per, sur, par, por"
TOLERANCE = "tol, tolerance, toleranz, tolerances, tolerancia, tolleranza, +/-"
NEGATIONS = "not, no, non, nicht, kein, keine, never, pas de, sin, senza, sans, ohne, without, instead of, free of"

HARMLESS = (
    "please, pls, but, then, only if, both, plz, kindly, quote, quotation, offer, price, need, needs, needed, want, wanted, require, required, req'd, reqd, request, requires, urgent, asap, supply, supplied,"
    " order, enquiry, inquiry, rfq, for, of, with, and, the, an, in stock, stock, from stock, ex stock, our, your, we, i, you, is, are, has, have, be, to be, should, shall, must, with a, each of,"
    " as, at, on, item, pos, position, ref, material, mat, matl, mtl, material grade, grade of material, alloy, metal, werkstoff, werkst, w-nr, w nr, wnr, werkstoffnr, werkstoff-nr, werkstoff nr,"
    " en, din, aisi, uns, jis, astm, type, typ, grade, gr, spec, specification, quality, qualitat, made of, made from, in, aus, de, du, des, en acier, di, del, della, da, la, le, les, el, con,"
    " avec, mit, und, et, e, y, und zwar, fur, pour, para, per metre run, hello, hi, thanks, thank you, regards, approx, about, ca, circa, approximately, nominally, etwa, environ, roughly, around,"
    " trimmed, trimmed edges, edges, edge, selvedge, selvage, raw edge, raw edges, cut edges, hemmed, hooked, selvedged, webkante, schnittkante, tolerances to, standard, std, new, good, clean, dry,"
    " delivery, delivered, deliver, lieferung, net, size, sizes, dimension, dimensions, dim, dims, abmessung, abmessungen, format, suitable for, to suit, use, used, application, machine, sifter, shaker, separator, dryer,"
    " drawing, dwg, zeichnung, acceptable, accepted, ok, okay, also ok, will do, preferred, wire cloth to, according to, acc to, acc, to, per, as per, gem, gemass, nach, selon, segun, secondo, conforming, conform, stainless quality,"
    " food grade, food, pharma, sample, samples, one, two, both ways, each way, both directions, in both directions, square both ways, equal, average, avg, individual, nominal size, total, only, nur, custom, made, mesh type,"
    " industrial, industrial quality, commercial, commercial quality, packed, packing, pallet, crate, boxed, export, p/n, part, part no, art, art-nr, artnr, artikel, article, item no, sku, code, w/,"
    " direction, long way, warp direction, along, across, roll direction, long side parallel to warp, over, den, der, die, das, ein, eine, einem, un, une, una, uno, cut, cut from, any, i need, looking for, a, via, this, that, if, possible, available, me, us, my"
)
"""Words that carry nothing about the cloth."""

PART_NUMBERS = "p/n, pn, part no, part number, part nr, part, art-nr, artnr, art nr, artikel-nr, artikelnr, artikelnummer, item no, item number, item code, sku, stock code, our ref, your ref, ref no, ref, code, material no, mat-nr, dwg no, drawing no, po, po no, po number, order no, pos, item, line, drg no, drg, zeichnung nr, zeichnungs-nr"
"""Words behind which a number names an order or an article, not the cloth."""

DELIVERIES = "delivery, deliver, delivered, deliver by, due, by, date, dated, liefertermin, lieferung, termin, until, before, week, kw, wk"
