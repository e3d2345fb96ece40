"""The tables of the store. What each column means; lengths in mm, masses in kg/m², money in smallest units.

Searching and reading don't come here: building these objects takes longer than answering. They serve writing
and the check that migrations and tables agree.
"""

from sqlalchemy import (
    BigInteger,
    Boolean,
    CheckConstraint,
    Column,
    Float,
    ForeignKey,
    Index,
    Integer,
    MetaData,
    String,
    Table,
    Text,
    UniqueConstraint,
)

NAMING = {
    "ix": "ix_%(table_name)s_%(column_0_N_name)s",
    "uq": "uq_%(table_name)s_%(column_0_N_name)s",
    "ck": "ck_%(table_name)s_%(constraint_name)s",
    "fk": "fk_%(table_name)s_%(column_0_name)s_%(referred_table_name)s",
    "pk": "pk_%(table_name)s",
}
METADATA = MetaData(naming_convention=NAMING)

meta = Table(
    "meta",
    METADATA,
    Column("name", String, primary_key=True),
    Column("value", Text, nullable=False),
)

cloth = Table(
    "cloth",
    METADATA,
    Column("id", String, primary_key=True),
    Column("name", Text, nullable=False),
    Column("weave", String, nullable=False),
    Column("alloy", String),
    Column("crimp", String),
    Column("finish", String),
    # as somebody sells it, kept as written
    Column("declared", Text, nullable=False),
    Column("declared_by", String, nullable=False),
    Column("warp_text", Text, nullable=False),
    Column("weft_text", Text, nullable=False),
    Column("unit", String, nullable=False),
    Column("warp_wire_text", Text, nullable=False),
    Column("weft_wire_text", Text, nullable=False),
    Column("wire_unit", String, nullable=False),
    Column("unit_system", String, nullable=False),
    # what that is, exactly: rationals of a millimetre as text
    Column("warp_pitch", Text, nullable=False),
    Column("weft_pitch", Text, nullable=False),
    Column("warp_wire", Text, nullable=False),
    Column("weft_wire", Text, nullable=False),
    Column("rating_um", Float),
    Column("rating_kind", String),
    Column("rating_method", String),
    Column("grade", String),
    Column("standard", String),
    Column("stated_open_area_pct", Float),
    Column("stated_mass_kg_m2", Float),
    Column("stated_aperture_mm", Float),
    Column("stated_count_per_in", Float),
    Column("source", Text, nullable=False),
    Column("demo", Boolean, nullable=False),
    # derived when written, by the version of the derivation named here
    Column("derivation", Integer, nullable=False),
    Column("warp_pitch_mm", Float, nullable=False),
    Column("weft_pitch_mm", Float, nullable=False),
    Column("warp_wire_mm", Float, nullable=False),
    Column("weft_wire_mm", Float, nullable=False),
    Column("warp_aperture_mm", Float),
    Column("weft_aperture_mm", Float),
    Column("open_area_pct", Float),
    Column("mass_kg_m2", Float),
    Column("mass_geometric_kg_m2", Float),
    Column("thickness_mm", Float, nullable=False),
    Column("porosity", Float),
    Column("sphere_um", Float),
    Column("aperture_band", Integer),
    Column("ln_aperture_mean", Float),
    Column("ln_aperture_skew", Float),
    Column("pitch_band", Integer, nullable=False),
    Column("ln_pitch_mean", Float, nullable=False),
    Column("ln_pitch_skew", Float, nullable=False),
    Column("ln_wire_mean", Float, nullable=False),
    Column("ln_wire_skew", Float, nullable=False),
    Column("ln_open_area", Float),
    Column("ln_rating", Float),
    CheckConstraint("source <> ''", name="source_is_named"),
    CheckConstraint("unit <> '' AND wire_unit <> ''", name="units_are_named"),
    CheckConstraint(
        "(weave IN ('plain', 'twilled')) = (ln_aperture_mean IS NOT NULL AND ln_open_area IS NOT NULL)",
        name="only_square_and_rectangular_open",
    ),
)
APERTURE_AXES = ("aperture_band", "ln_wire_mean", "ln_aperture_mean", "ln_aperture_skew", "ln_wire_skew")
PITCH_AXES = ("pitch_band", "ln_wire_mean", "ln_pitch_mean", "ln_pitch_skew", "ln_wire_skew")
Index("ix_cloth_apertures", *(cloth.c[n] for n in ("weave", *APERTURE_AXES, "ln_open_area", "open_area_pct", "id")))
Index(
    "ix_cloth_alloy_apertures",
    *(cloth.c[n] for n in ("alloy", "weave", *APERTURE_AXES, "ln_open_area", "open_area_pct", "id")),
)
Index("ix_cloth_pitches", *(cloth.c[n] for n in ("weave", *PITCH_AXES, "ln_rating", "ln_open_area", "alloy", "id")))
Index("ix_cloth_open_area", cloth.c.weave, cloth.c.ln_open_area, cloth.c.id)
Index("ix_cloth_wires", cloth.c.weave, cloth.c.ln_wire_mean, cloth.c.ln_wire_skew, cloth.c.id)
Index("ix_cloth_rating", cloth.c.weave, cloth.c.ln_rating, cloth.c.id)

article = Table(
    "article",
    METADATA,
    Column("id", String, primary_key=True),
    Column("cloth", ForeignKey("cloth.id"), nullable=False, index=True),
    Column("part_number", Text, nullable=False),
    Column("seller", Text, nullable=False),
    Column("price_minor_per_m2", BigInteger),
    Column("currency", String),
    Column("minimum_mm2", BigInteger),
    Column("lead_days", Integer),
    Column("roll_sizes_mm", Text, nullable=False),
    Column("source", Text, nullable=False),
    Column("demo", Boolean, nullable=False),
    CheckConstraint("(price_minor_per_m2 IS NULL) = (currency IS NULL)", name="price_has_currency"),
)

alias = Table(
    "alias",
    METADATA,
    Column("id", Integer, primary_key=True),
    Column("cloth", ForeignKey("cloth.id"), nullable=False, index=True),
    Column("whose", Text, nullable=False),
    Column("number", Text, nullable=False),
    Column("source", Text, nullable=False),
    Column("demo", Boolean, nullable=False),
    UniqueConstraint("whose", "number", "cloth"),
)

lot = Table(
    "lot",
    METADATA,
    Column("id", String, primary_key=True),
    Column("cloth", ForeignKey("cloth.id"), nullable=False, index=True),
    Column("article", ForeignKey("article.id"), index=True),
    Column("form", String, nullable=False),
    Column("width_mm", BigInteger, nullable=False),
    Column("selvedge_mm", BigInteger, nullable=False),
    Column("length_mm", BigInteger, nullable=False),
    Column("reserved_mm", BigInteger, nullable=False),
    Column("seams", Integer, nullable=False),
    Column("location", Text, nullable=False),
    Column("heat", Text),
    Column("certificate", String),
    Column("received", String),
    Column("cost_minor_per_m2", BigInteger),
    Column("currency", String),
    Column("source", Text, nullable=False),
    Column("demo", Boolean, nullable=False),
    Column("version", Integer, nullable=False),
    CheckConstraint("length_mm >= 0 AND reserved_mm >= 0 AND reserved_mm <= length_mm", name="balance_holds"),
    CheckConstraint("width_mm > 2 * selvedge_mm AND selvedge_mm >= 0", name="width_is_usable"),
)

movement = Table(
    "movement",
    METADATA,
    Column("id", Integer, primary_key=True),
    Column("lot", ForeignKey("lot.id"), nullable=False, index=True),
    Column("at", String, nullable=False),
    Column("kind", String, nullable=False),
    Column("length_change_mm", BigInteger, nullable=False),
    Column("reserved_change_mm", BigInteger, nullable=False),
    Column("length_after_mm", BigInteger, nullable=False),
    Column("reserved_after_mm", BigInteger, nullable=False),
    Column("location", Text, nullable=False),
    Column("person", Text, nullable=False),
    Column("note", Text, nullable=False),
)

decision = Table(
    "decision",
    METADATA,
    Column("id", Integer, primary_key=True),
    Column("at", String, nullable=False),
    Column("asked", Text, nullable=False),
    Column("purpose", String, nullable=False),
    Column("cloth", String, nullable=False, index=True),
    Column("offered", Text, nullable=False),
    Column("verdict", String, nullable=False),
    Column("found", Text, nullable=False),
    Column("kind", String, nullable=False),
    Column("approved_by", Text),
    Column("note", Text, nullable=False),
)
