# Sourced by run.sh: what no later step can do without.

command -v node >/dev/null || fail 'Node' 'it is not installed, and Leadline needs Node 20.9 or later'
node -e 'const [a, b] = process.versions.node.split("."); process.exit(+a > 20 || (+a === 20 && +b >= 9) ? 0 : 1)' ||
  fail 'Node' "version $(node -p process.versions.node) is too old, and Leadline needs 20.9 or later"
command -v npm >/dev/null || fail 'Node' 'npm is not installed beside it'
can_keep "$PROJECT"
make_data_folder
