"""The migrations of the store, applied by storage.migrating."""
