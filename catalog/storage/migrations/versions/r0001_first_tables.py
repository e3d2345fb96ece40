"""The first tables: cloths, articles, aliases, lots, movements, decisions.

Revision ID: 0001
"""

import sqlalchemy as sa
from alembic import op

revision = "0001"
down_revision = None
branch_labels = None
depends_on = None


def upgrade() -> None:
    """Make every table."""
    op.create_table(
        "cloth",
        sa.Column("id", sa.String(), nullable=False),
        sa.Column("name", sa.Text(), nullable=False),
        sa.Column("weave", sa.String(), nullable=False),
        sa.Column("alloy", sa.String(), nullable=True),
        sa.Column("crimp", sa.String(), nullable=True),
        sa.Column("finish", sa.String(), nullable=True),
        sa.Column("declared", sa.Text(), nullable=False),
        sa.Column("declared_by", sa.String(), nullable=False),
        sa.Column("warp_text", sa.Text(), nullable=False),
        sa.Column("weft_text", sa.Text(), nullable=False),
        sa.Column("unit", sa.String(), nullable=False),
        sa.Column("warp_wire_text", sa.Text(), nullable=False),
        sa.Column("weft_wire_text", sa.Text(), nullable=False),
        sa.Column("wire_unit", sa.String(), nullable=False),
        sa.Column("unit_system", sa.String(), nullable=False),
        sa.Column("warp_pitch", sa.Text(), nullable=False),
        sa.Column("weft_pitch", sa.Text(), nullable=False),
        sa.Column("warp_wire", sa.Text(), nullable=False),
        sa.Column("weft_wire", sa.Text(), nullable=False),
        sa.Column("rating_um", sa.Float(), nullable=True),
        sa.Column("rating_kind", sa.String(), nullable=True),
        sa.Column("rating_method", sa.String(), nullable=True),
        sa.Column("grade", sa.String(), nullable=True),
        sa.Column("standard", sa.String(), nullable=True),
        sa.Column("stated_open_area_pct", sa.Float(), nullable=True),
        sa.Column("stated_mass_kg_m2", sa.Float(), nullable=True),
        sa.Column("stated_aperture_mm", sa.Float(), nullable=True),
        sa.Column("stated_count_per_in", sa.Float(), nullable=True),
        sa.Column("source", sa.Text(), nullable=False),
        sa.Column("demo", sa.Boolean(), nullable=False),
        sa.Column("derivation", sa.Integer(), nullable=False),
        sa.Column("warp_pitch_mm", sa.Float(), nullable=False),
        sa.Column("weft_pitch_mm", sa.Float(), nullable=False),
        sa.Column("warp_wire_mm", sa.Float(), nullable=False),
        sa.Column("weft_wire_mm", sa.Float(), nullable=False),
        sa.Column("warp_aperture_mm", sa.Float(), nullable=True),
        sa.Column("weft_aperture_mm", sa.Float(), nullable=True),
        sa.Column("open_area_pct", sa.Float(), nullable=True),
        sa.Column("mass_kg_m2", sa.Float(), nullable=True),
        sa.Column("mass_geometric_kg_m2", sa.Float(), nullable=True),
        sa.Column("thickness_mm", sa.Float(), nullable=False),
        sa.Column("porosity", sa.Float(), nullable=True),
        sa.Column("sphere_um", sa.Float(), nullable=True),
        sa.Column("aperture_band", sa.Integer(), nullable=True),
        sa.Column("ln_aperture_mean", sa.Float(), nullable=True),
        sa.Column("ln_aperture_skew", sa.Float(), nullable=True),
        sa.Column("pitch_band", sa.Integer(), nullable=False),
        sa.Column("ln_pitch_mean", sa.Float(), nullable=False),
        sa.Column("ln_pitch_skew", sa.Float(), nullable=False),
        sa.Column("ln_wire_mean", sa.Float(), nullable=False),
        sa.Column("ln_wire_skew", sa.Float(), nullable=False),
        sa.Column("ln_open_area", sa.Float(), nullable=True),
        sa.Column("ln_rating", sa.Float(), nullable=True),
        sa.CheckConstraint(
            "(weave IN ('plain', 'twilled')) = (ln_aperture_mean IS NOT NULL AND ln_open_area IS NOT NULL)",
            name=op.f("ck_cloth_only_square_and_rectangular_open"),
        ),
        sa.CheckConstraint("source <> ''", name=op.f("ck_cloth_source_is_named")),
        sa.CheckConstraint("unit <> '' AND wire_unit <> ''", name=op.f("ck_cloth_units_are_named")),
        sa.PrimaryKeyConstraint("id", name=op.f("pk_cloth")),
    )
    op.create_index(
        "ix_cloth_alloy_apertures",
        "cloth",
        [
            "alloy",
            "weave",
            "aperture_band",
            "ln_wire_mean",
            "ln_aperture_mean",
            "ln_aperture_skew",
            "ln_wire_skew",
            "ln_open_area",
            "open_area_pct",
            "id",
        ],
        unique=False,
    )
    op.create_index(
        "ix_cloth_apertures",
        "cloth",
        [
            "weave",
            "aperture_band",
            "ln_wire_mean",
            "ln_aperture_mean",
            "ln_aperture_skew",
            "ln_wire_skew",
            "ln_open_area",
            "open_area_pct",
            "id",
        ],
        unique=False,
    )
    op.create_index("ix_cloth_open_area", "cloth", ["weave", "ln_open_area", "id"], unique=False)
    op.create_index(
        "ix_cloth_pitches",
        "cloth",
        [
            "weave",
            "pitch_band",
            "ln_wire_mean",
            "ln_pitch_mean",
            "ln_pitch_skew",
            "ln_wire_skew",
            "ln_rating",
            "ln_open_area",
            "alloy",
            "id",
        ],
        unique=False,
    )
    op.create_index("ix_cloth_rating", "cloth", ["weave", "ln_rating", "id"], unique=False)
    op.create_index("ix_cloth_wires", "cloth", ["weave", "ln_wire_mean", "ln_wire_skew", "id"], unique=False)
    op.create_table(
        "decision",
        sa.Column("id", sa.Integer(), nullable=False),
        sa.Column("at", sa.String(), nullable=False),
        sa.Column("asked", sa.Text(), nullable=False),
        sa.Column("purpose", sa.String(), nullable=False),
        sa.Column("cloth", sa.String(), nullable=False),
        sa.Column("offered", sa.Text(), nullable=False),
        sa.Column("verdict", sa.String(), nullable=False),
        sa.Column("found", sa.Text(), nullable=False),
        sa.Column("kind", sa.String(), nullable=False),
        sa.Column("approved_by", sa.Text(), nullable=True),
        sa.Column("note", sa.Text(), nullable=False),
        sa.PrimaryKeyConstraint("id", name=op.f("pk_decision")),
    )
    op.create_index(op.f("ix_decision_cloth"), "decision", ["cloth"], unique=False)
    op.create_table(
        "meta",
        sa.Column("name", sa.String(), nullable=False),
        sa.Column("value", sa.Text(), nullable=False),
        sa.PrimaryKeyConstraint("name", name=op.f("pk_meta")),
    )
    op.create_table(
        "alias",
        sa.Column("id", sa.Integer(), nullable=False),
        sa.Column("cloth", sa.String(), nullable=False),
        sa.Column("whose", sa.Text(), nullable=False),
        sa.Column("number", sa.Text(), nullable=False),
        sa.Column("source", sa.Text(), nullable=False),
        sa.Column("demo", sa.Boolean(), nullable=False),
        sa.ForeignKeyConstraint(["cloth"], ["cloth.id"], name=op.f("fk_alias_cloth_cloth")),
        sa.PrimaryKeyConstraint("id", name=op.f("pk_alias")),
        sa.UniqueConstraint("whose", "number", "cloth", name=op.f("uq_alias_whose_number_cloth")),
    )
    op.create_index(op.f("ix_alias_cloth"), "alias", ["cloth"], unique=False)
    op.create_table(
        "article",
        sa.Column("id", sa.String(), nullable=False),
        sa.Column("cloth", sa.String(), nullable=False),
        sa.Column("part_number", sa.Text(), nullable=False),
        sa.Column("seller", sa.Text(), nullable=False),
        sa.Column("price_minor_per_m2", sa.BigInteger(), nullable=True),
        sa.Column("currency", sa.String(), nullable=True),
        sa.Column("minimum_mm2", sa.BigInteger(), nullable=True),
        sa.Column("lead_days", sa.Integer(), nullable=True),
        sa.Column("roll_sizes_mm", sa.Text(), nullable=False),
        sa.Column("source", sa.Text(), nullable=False),
        sa.Column("demo", sa.Boolean(), nullable=False),
        sa.CheckConstraint(
            "(price_minor_per_m2 IS NULL) = (currency IS NULL)", name=op.f("ck_article_price_has_currency")
        ),
        sa.ForeignKeyConstraint(["cloth"], ["cloth.id"], name=op.f("fk_article_cloth_cloth")),
        sa.PrimaryKeyConstraint("id", name=op.f("pk_article")),
    )
    op.create_index(op.f("ix_article_cloth"), "article", ["cloth"], unique=False)
    op.create_table(
        "lot",
        sa.Column("id", sa.String(), nullable=False),
        sa.Column("cloth", sa.String(), nullable=False),
        sa.Column("article", sa.String(), nullable=True),
        sa.Column("form", sa.String(), nullable=False),
        sa.Column("width_mm", sa.BigInteger(), nullable=False),
        sa.Column("selvedge_mm", sa.BigInteger(), nullable=False),
        sa.Column("length_mm", sa.BigInteger(), nullable=False),
        sa.Column("reserved_mm", sa.BigInteger(), nullable=False),
        sa.Column("seams", sa.Integer(), nullable=False),
        sa.Column("location", sa.Text(), nullable=False),
        sa.Column("heat", sa.Text(), nullable=True),
        sa.Column("certificate", sa.String(), nullable=True),
        sa.Column("received", sa.String(), nullable=True),
        sa.Column("cost_minor_per_m2", sa.BigInteger(), nullable=True),
        sa.Column("currency", sa.String(), nullable=True),
        sa.Column("source", sa.Text(), nullable=False),
        sa.Column("demo", sa.Boolean(), nullable=False),
        sa.Column("version", sa.Integer(), nullable=False),
        sa.CheckConstraint(
            "length_mm >= 0 AND reserved_mm >= 0 AND reserved_mm <= length_mm", name=op.f("ck_lot_balance_holds")
        ),
        sa.CheckConstraint("width_mm > 2 * selvedge_mm AND selvedge_mm >= 0", name=op.f("ck_lot_width_is_usable")),
        sa.ForeignKeyConstraint(["article"], ["article.id"], name=op.f("fk_lot_article_article")),
        sa.ForeignKeyConstraint(["cloth"], ["cloth.id"], name=op.f("fk_lot_cloth_cloth")),
        sa.PrimaryKeyConstraint("id", name=op.f("pk_lot")),
    )
    op.create_index(op.f("ix_lot_article"), "lot", ["article"], unique=False)
    op.create_index(op.f("ix_lot_cloth"), "lot", ["cloth"], unique=False)
    op.create_table(
        "movement",
        sa.Column("id", sa.Integer(), nullable=False),
        sa.Column("lot", sa.String(), nullable=False),
        sa.Column("at", sa.String(), nullable=False),
        sa.Column("kind", sa.String(), nullable=False),
        sa.Column("length_change_mm", sa.BigInteger(), nullable=False),
        sa.Column("reserved_change_mm", sa.BigInteger(), nullable=False),
        sa.Column("length_after_mm", sa.BigInteger(), nullable=False),
        sa.Column("reserved_after_mm", sa.BigInteger(), nullable=False),
        sa.Column("location", sa.Text(), nullable=False),
        sa.Column("person", sa.Text(), nullable=False),
        sa.Column("note", sa.Text(), nullable=False),
        sa.ForeignKeyConstraint(["lot"], ["lot.id"], name=op.f("fk_movement_lot_lot")),
        sa.PrimaryKeyConstraint("id", name=op.f("pk_movement")),
    )
    op.create_index(op.f("ix_movement_lot"), "movement", ["lot"], unique=False)
