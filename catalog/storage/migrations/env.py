"""What Alembic runs for each command: upgrade over the connection that it was handed."""

from alembic import context

from catalog.storage.tables import METADATA

context.configure(
    connection=context.config.attributes["connection"],
    target_metadata=METADATA,
    render_as_batch=True,
    transactional_ddl=False,  # the caller's transaction holds everything
)
context.run_migrations()
