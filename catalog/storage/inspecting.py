"""What a file says of itself before a database library touches it; and whether it may be written."""

import os
from dataclasses import dataclass
from pathlib import Path

from catalog.errors import StoreError
from catalog.storage.engine import APPLICATION_ID

MAGIC = b"SQLite format 3\0"
HEADER_BYTES = 100
WRITE_BITS = 0o222
SHARED_FOLDERS = frozenset(
    (
        *("nfs", "nfs4", "cifs", "smb3", "smbfs", "9p", "afs", "ceph", "lustre"),
        *("fuse.sshfs", "fuse.glusterfs", "fuse.rclone"),
    )
)


@dataclass(frozen=True, slots=True)
class Access:
    """How a store's file can be opened."""

    is_writable: bool
    mode: str
    """For storage.engine: 'rw', 'ro' or 'immutable'."""


def check_file(path: Path) -> None:
    """Raise StoreError where *path* isn't a whole store of ours. Reads 100 bytes, changes nothing.

    Source of the offsets: the SQLite file format, section 1.3 (page size at 16, change counter at 24, page
    count at 28, application id at 68, version-valid-for at 92).
    """
    if not path.is_file():
        kind = "is a folder" if path.is_dir() else "isn't a file"
        raise StoreError(f"{path} {kind}, not a crosscloth store.", str(path))
    head = _head(path)
    if not head:
        raise StoreError(f"{path} is empty, not a crosscloth store: remove it or name another file.", str(path))
    if not head.startswith(MAGIC[: len(head)]):
        raise StoreError(f"{path} is not a crosscloth store: it isn't a database.", str(path))
    if len(head) < HEADER_BYTES or _is_cut_short(path, head):
        raise StoreError(f"The store {path} is cut short: restore it from a backup.", str(path))
    if int.from_bytes(head[68:72], "big") != APPLICATION_ID:
        raise StoreError(f"{path} is a database, but not a crosscloth store.", str(path))


def _head(path: Path) -> bytes:
    try:
        with path.open("rb") as file:
            return file.read(HEADER_BYTES)
    except OSError as error:
        why = error.strerror or type(error).__name__
        raise StoreError(f"The store {path} can't be read: {why.lower()}.", str(path)) from error


def _is_cut_short(path: Path, head: bytes) -> bool:
    """Fewer bytes than the header counts, where its count is valid and no log holds later pages."""
    page = int.from_bytes(head[16:18], "big")
    size = 65536 if page == 1 else page
    is_counted = head[24:28] == head[92:96]
    whole = int.from_bytes(head[28:32], "big") * size
    return is_counted and not _has_log(path) and path.stat().st_size < whole


def _has_log(path: Path) -> bool:
    log = path.with_name(f"{path.name}-wal")
    return log.exists() and log.stat().st_size > 0


def access(path: Path) -> Access:
    """How *path* can be opened. Mode bits count even where the user could override them.

    A log beside a file that can't be written belongs to somebody who can: then it has to be read with locks.
    """
    if _may_write(path) and _may_write(path.parent):
        return Access(True, "rw")
    return Access(False, "ro" if _has_log(path) else "immutable")


def _may_write(path: Path) -> bool:
    return bool(path.stat().st_mode & WRITE_BITS) and os.access(path, os.W_OK)


def is_on_shared_folder(path: Path, mounts: Path = Path("/proc/self/mounts")) -> bool:
    """True where *path* lies on a network file system, as far as the system lists its mounts.

    Write-ahead logging needs memory that all users share, so it does not work there.
    """
    try:
        lines = [line.split() for line in mounts.read_text("utf-8", "replace").splitlines()]
    except OSError:
        return False
    above = {str(p) for p in (path, *path.parents)}
    kinds = [(len(line[1]), line[2]) for line in lines if len(line) > 2 and line[1] in above]
    return bool(kinds) and max(kinds)[1] in SHARED_FOLDERS
