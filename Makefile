# Each target hands over to db/run.sh. Two things look odd and are meant: with -q GNU make still runs the lines marked +,
# but says nothing of its own when one of them exits 1, so the last line of `make test` is the count and a failed
# `make start` is one sentence. MAKEFLAGS is taken out of the environment so that nothing below inherits -q.
MAKEFLAGS += -q
RUN := +@exec env -u MAKEFLAGS -u MFLAGS -u MAKELEVEL bash db/run.sh

.PHONY: start test bench check-ledger

# Installs what is missing, then runs Leadline on http://127.0.0.1:3000 until Ctrl-C.
# Settings: PORT, HOST, PUBLIC_URL, DEMO=no, DATABASE_URL, DATABASE_PORT, DATA_DIR.
start:
	$(RUN) start

# Types, lint, import rules, unit, database, API and browser tests; the last line is "N passed, N failed".
test:
	$(RUN) test

# Measures what Leadline promises of its speed and prints each figure beside its limit; a report, not a test.
# ONLY=drawing,list runs some of test/bench alone.
bench:
	$(RUN) bench

# Proves the stock ledger of the database that `make start` uses.
check-ledger:
	$(RUN) check-ledger
