#!/usr/bin/env bash
# CPU seconds (user + system) of whole processes: Annulet's mesher, JVM start included, and gmsh -2.
# usage: compare.sh CLASSPATH     CLASSPATH: mesher/target/classes, test-classes, jts-core and assertj jars
set -eu
here=$(cd "$(dirname "$0")" && pwd)
classpath=$1
out=$(mktemp -d)
trap 'rm -r "$out"' EXIT
TIMEFORMAT='%U %S'
cpu() { # least of three runs
  local best=
  for _ in 1 2 3; do
    local t
    t=$( { time "$@" > "$out/log" 2>&1; } 2>&1 | awk '{print $1 + $2}')
    best=$(printf '%s\n%s\n' "${best:-$t}" "$t" | sort -g | head -1)
  done
  echo "$best"
}
ours() { cpu java -Xmx3g -XX:+UseSerialGC -cp "$classpath" org.annulet.mesher.triangulate.MeshingBenchmark "$@"; }
theirs() { cpu gmsh -2 "$here/chamber.geo" -setnumber graded "$1" -setnumber h "$2" -format msh41 -bin -o "$out/mesh.msh"; }
nodes_of_gmsh() { gmsh -2 "$here/chamber.geo" -setnumber graded "$1" -setnumber h "$2" -format msh2 -o "$out/n.msh" > /dev/null; sed -n '/\$Nodes/{n;p}' "$out/n.msh"; }
compare() { # name graded our-size gmsh-size
  local a b
  a=$(ours "$1" "$3"); echo "$1: annulet $a s: $(cat "$out/log")"
  b=$(theirs "$2" "$4"); echo "$1: gmsh    $b s: $(nodes_of_gmsh "$2" "$4") nodes"
  awk "BEGIN { printf \"$1: ratio %.2f\n\", $a / $b }"
}
compare uniform 0 0.00116 0.000793
compare graded 1 0.00027 0.000203
for h in 0.0036 0.00116 0.000366; do
  t=$(ours uniform $h); echo "growth: $t s: $(cat "$out/log")"
done
