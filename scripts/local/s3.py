"""A store with the S3 interface on loopback, for development and tests: the proxy, account, container and object
servers of OpenStack Swift (Debian's python3-swift) in one process, without memcached and without root.

Run by scripts/local/store.mjs with Debian's /usr/bin/python3. Settings come by environment, where other accounts
cannot read them: HOLDGROUND_S3_FOLDER, _PORT (four ports from here), _ACCESS_KEY (account:user), _SECRET_KEY, _ORIGINS.
"""
import os
import signal
import socket
import sys


def step_down(folder):
    """Root owns nothing here: the folder goes to nobody, and so does the process."""
    if os.geteuid() != 0:
        return
    nobody = 65534
    os.chown(folder, nobody, nobody)
    os.setgroups([])
    os.setgid(nobody)
    os.setuid(nobody)


folder = os.path.abspath(os.environ["HOLDGROUND_S3_FOLDER"])
port = int(os.environ["HOLDGROUND_S3_PORT"])
account, user = os.environ["HOLDGROUND_S3_ACCESS_KEY"].split(":")
secret_key = os.environ["HOLDGROUND_S3_SECRET_KEY"]
origins = os.environ["HOLDGROUND_S3_ORIGINS"]

os.umask(0o077)
os.makedirs(folder, exist_ok=True)
step_down(folder)
os.environ["HOME"] = folder
os.chdir(folder)

import eventlet  # noqa: E402  (after stepping down, so that nothing is loaded as root)

eventlet.monkey_patch()

from eventlet import wsgi  # noqa: E402

settings = os.path.join(folder, "settings")
devices = os.path.join(folder, "nodes")
for made in (settings, os.path.join(devices, "d1")):
    os.makedirs(made, exist_ok=True)


def write(name, text):
    path = os.path.join(settings, name)
    with open(path, "w", encoding="utf-8") as out:
        out.write(text)
    return path


write(
    "swift.conf",
    "[swift-hash]\nswift_hash_path_suffix = local\nswift_hash_path_prefix = local\n"
    "[storage-policy:0]\nname = one\ndefault = yes\n",
)

import swift.common.utils as swift_utils  # noqa: E402

swift_utils.SWIFT_CONF_FILE = os.path.join(settings, "swift.conf")
swift_utils.validate_hash_conf()

from swift.common import storage_policy  # noqa: E402

storage_policy.reload_storage_policies()

from swift.common.ring import RingBuilder  # noqa: E402
from swift.common.wsgi import SwiftHttpProtocol, loadapp  # noqa: E402

shared = (
    f"swift_dir = {settings}\ndevices = {devices}\nmount_check = false\n"
    "disable_fallocate = true\nfallocate_reserve = 0\n"
)


def listen(on):
    listener = eventlet.listen(("127.0.0.1", on), reuse_port=False)
    listener.setsockopt(socket.IPPROTO_TCP, socket.TCP_NODELAY, 1)
    return listener


listeners, configurations = {}, {}
for offset, kind in enumerate(("account", "container", "object"), start=1):
    listeners[kind] = listen(port + offset)
    ring = RingBuilder(4, 1, 0)
    ring.add_dev({"region": 1, "zone": 1, "ip": "127.0.0.1", "port": port + offset, "device": "d1", "weight": 1})
    ring.rebalance()
    ring.get_ring().save(os.path.join(settings, f"{kind}.ring.gz"))
    configurations[kind] = write(
        f"{kind}-server.conf",
        f"[DEFAULT]\n{shared}[pipeline:main]\npipeline = {kind}-server\n"
        f"[app:{kind}-server]\nuse = egg:swift#{kind}\n{shared}",
    )

# The cache filter must be there or every request fails; the memcached that it points to need not run.
filters = {
    "catch_errors": "",
    "gatekeeper": "",
    "healthcheck": "",
    "cache": "memcache_servers = 127.0.0.1:1\n",
    "listing_formats": "",
    "bulk": "",
    "s3api": f"location = us-east-1\ns3_acl = false\ncors_preflight_allow_origin = {origins}\n"
    "min_segment_size = 5242880\n",
    "tempauth": f"user_{account}_{user} = {secret_key} .admin\n",
    "copy": "",
    "slo": "",
    "dlo": "",
    "versioned_writes": "allow_versioned_writes = true\nallow_object_versioning = true\n",
    "symlink": "",
}
proxy = (
    f"[DEFAULT]\n{shared}cors_allow_origin = {origins}\nstrict_cors_mode = true\n"
    f"[pipeline:main]\npipeline = {' '.join(filters)} proxy-server\n"
    f"[app:proxy-server]\nuse = egg:swift#proxy\naccount_autocreate = true\nallow_account_management = true\n{shared}"
)
for name, lines in filters.items():
    proxy += f"[filter:{name}]\nuse = egg:swift#{'memcache' if name == 'cache' else name}\n{lines}"
configurations["proxy"] = write("proxy-server.conf", proxy)
listeners["proxy"] = listen(port)

for stop in (signal.SIGTERM, signal.SIGINT):
    signal.signal(stop, lambda *_: os._exit(0))

pool = eventlet.GreenPool(2000)
nowhere = open(os.devnull, "w", encoding="utf-8")
for kind in ("account", "container", "object", "proxy"):
    application = loadapp(configurations[kind], global_conf={"log_name": kind, "log_level": "ERROR"})
    eventlet.spawn(
        wsgi.server,
        listeners[kind],
        application,
        nowhere,
        custom_pool=pool,
        protocol=SwiftHttpProtocol,
        keepalive=True,
        socket_timeout=None,
        debug=False,
    )
print(f"S3 on http://127.0.0.1:{port}", flush=True)
sys.stdout.flush()
eventlet.hubs.get_hub().switch()
