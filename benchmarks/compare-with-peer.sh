#!/usr/bin/env bash
# Step time against the hand-written C program, in alternating runs on one core, fresh processes.
#   benchmarks/compare-with-peer.sh [points] [rounds] [integrator] [lanes]
# Needs gcc and FFTW 3 (Debian: libfftw3-dev) and a built benchmarks.jar (mvn -DskipTests package).
set -euo pipefail
cd "$(dirname "$0")"
points=${1:-256} rounds=${2:-5} integrator=${3:-Rk4Ip} lanes=${4:-1}
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
gcc -O3 -march=native -ffast-math peer/coupled_rk4ip_fftw.c -o "$work/peer" -lfftw3 -lm
pin=""
command -v taskset >/dev/null && pin="taskset -c 0"
steps=$((5000000 / points))
for round in $(seq "$rounds"); do
  c=$($pin "$work/peer" "$points" "$steps" 0.02 1 3 | sed 's/.*: \([0-9.]*\) us.*/\1/')
  j=$($pin java -cp target/benchmarks.jar spgpe.benchmarks.StepTimer \
    "$points" $((steps / lanes)) 3 "$integrator" "$lanes" | sed 's/.*: \([0-9.]*\) us.*/\1/')
  echo "$round C=$c us  Java=$j us  ratio=$(awk "BEGIN{printf \"%.2f\", $j / $c}")"
done | tee "$work/table"
sed 's/.*ratio=//' "$work/table" | sort -n | awk '{r[NR]=$1} END {printf "median ratio %.2f (%.2f to %.2f)\n", r[int((NR+1)/2)], r[1], r[NR]}'
