#!/usr/bin/env bash
# Step times against the hand-written C programs of peer/, in alternating runs of fresh processes.
#   benchmarks/compare-with-peer.sh [rounds] [case pattern] [result file]
# Java versions: the homes in JAVA_HOMES (separated by colons), else the java of the path.
# Needs gcc and FFTW 3 (Debian: libfftw3-dev) and a built benchmarks.jar (mvn -DskipTests package).
set -euo pipefail
export LC_ALL=C
cd "$(dirname "$0")"
rounds=${1:-5} pattern=${2:-.} result=${3:-}
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
for program in coupled_rk4ip_fftw coupled_ou_rk4_ou_fftw coupled_2d_rk4ip_fftw; do
  gcc -O3 -march=native -ffast-math "peer/$program.c" -o "$work/$program" -lfftw3 -lm
done
if [ -n "${JAVA_HOMES:-}" ]; then
  IFS=: read -ra homes <<< "$JAVA_HOMES"
  javas=("${homes[@]/%//bin/java}")
else
  javas=("$(command -v java)")
fi

# name, C program, engine, points, scheme, lanes, shape
cases="
ensemble-128-vector   coupled_rk4ip_fftw      vector 128  Rk4Ip 8  line
ensemble-256-vector   coupled_rk4ip_fftw      vector 256  Rk4Ip 8  line
ensemble-1024-vector  coupled_rk4ip_fftw      vector 1024 Rk4Ip 8  line
default-256-vector    coupled_ou_rk4_ou_fftw  vector 256  OuRk4 8  line
ensemble-128-plain    coupled_rk4ip_fftw      plain  128  Rk4Ip 64 line
ensemble-256-plain    coupled_rk4ip_fftw      plain  256  Rk4Ip 64 line
ensemble-1024-plain   coupled_rk4ip_fftw      plain  1024 Rk4Ip 16 line
default-256-plain     coupled_ou_rk4_ou_fftw  plain  256  OuRk4 64 line
single-256-plain      coupled_rk4ip_fftw      plain  256  Rk4Ip 1  line
single-1024-plain     coupled_rk4ip_fftw      plain  1024 Rk4Ip 1  line
plane-64-vector       coupled_2d_rk4ip_fftw   vector   64  Rk4Ip 1 plane
plane-128-vector      coupled_2d_rk4ip_fftw   vector   128 Rk4Ip 1 plane
plane-256-vector      coupled_2d_rk4ip_fftw   vector   256 Rk4Ip 1 plane
plane-64-plain        coupled_2d_rk4ip_fftw   plain    64  Rk4Ip 1 plane
plane-128-plain       coupled_2d_rk4ip_fftw   plain    128 Rk4Ip 1 plane
plane-256-plain       coupled_2d_rk4ip_fftw   plain    256 Rk4Ip 1 plane
plane-64-provider     coupled_2d_rk4ip_fftw   provider 64  Rk4Ip 1 plane
plane-128-provider    coupled_2d_rk4ip_fftw   provider 128 Rk4Ip 1 plane
plane-256-provider    coupled_2d_rk4ip_fftw   provider 256 Rk4Ip 1 plane
"

microseconds() { sed 's/.*: \([0-9.]*\) us.*/\1/'; }

# Many short repeats, best of them: short enough to find quiet moments of a shared machine.
steps_of() { # points lanes shape
  local steps=$((20000 / $1 / $2))
  [ "$3" = plane ] && steps=1
  echo "$((steps > 0 ? steps : 1))"
}

repeats_of() { # points shape
  if [ "$2" = plane ]; then echo "$((40000 / $1))"; else echo 1200; fi
}

run_peer() { # program points shape
  MEAS=1 "$work/$1" "$2" "$(steps_of "$2" 1 "$3")" 0.02 1 "$(repeats_of "$2" "$3")" \
    | microseconds
}

run_java() { # java engine points scheme lanes shape
  local module=""
  [ "$2" = vector ] && module="--add-modules jdk.incubator.vector"
  # shellcheck disable=SC2086
  "$1" $module "-Dspgpe.engine=$2" -cp target/benchmarks.jar spgpe.benchmarks.StepTimer \
    "$3" "$(steps_of "$3" "$5" "$6")" "$(repeats_of "$3" "$6")" "$4" "$5" "$6" 2> /dev/null \
    | microseconds
}

# Compiled methods that the first compiler gave up run an order of magnitude slower.
check_compilation() { # java
  "$1" --add-modules jdk.incubator.vector -XX:+PrintCompilation -cp target/benchmarks.jar \
    spgpe.benchmarks.StepTimer 256 20 150 Rk4Ip 8 2> /dev/null > "$work/compilation"
  if grep "out of virtual registers" "$work/compilation" | grep spgpe; then
    echo "a method is too long for the first compiler: $1"
    exit 1
  fi
}

report() {
  echo "# Step times against the C programs"
  echo
  echo "\`benchmarks/compare-with-peer.sh $rounds $pattern\` on $(date -u +%Y-%m-%d), revision $(git rev-parse --short HEAD);"
  echo "$(nproc) processors ($(sed -n 's/^model name.*: //p' /proc/cpuinfo | head -1), $(grep -q avx512f /proc/cpuinfo && echo AVX-512 || echo no AVX-512)),"
  echo "load $(cut -d' ' -f1-3 /proc/loadavg); $(gcc --version | head -1), -O3 -march=native -ffast-math. Each round starts the C"
  echo "program and a fresh virtual machine, one after the other; the numbers are ratios Java / C of the time of a step of a trajectory."
  echo
  echo "| case | Java | median ratio | smallest to largest | times of C (us) |"
  echo "|---|---|---|---|---|"
  for java in "${javas[@]}"; do
    version=$("$java" -version 2>&1 | sed -n 's/.*version "\([^"]*\)".*/\1/p')
    check_compilation "$java"
    grep -E "$pattern" <<< "$cases" | while read -r name program engine points scheme lanes shape; do
      [ -n "$name" ] || continue
      : > "$work/ratios"
      : > "$work/peer"
      for _ in $(seq "$rounds"); do
        c=$(run_peer "$program" "$points" "$shape")
        j=$(run_java "$java" "$engine" "$points" "$scheme" "$lanes" "$shape")
        awk "BEGIN{printf \"%.3f\n\", $j / $c}" >> "$work/ratios"
        echo "$c" >> "$work/peer"
      done
      sort -n "$work/ratios" | awk -v name="$name" -v version="$version" \
        -v c="$(sort -n "$work/peer" | sed -n '1p;$p' | paste -sd' ' | sed 's/ / to /')" \
        '{r[NR]=$1} END {m=(r[int((NR+1)/2)]+r[int((NR+2)/2)])/2;
         printf "| %s | %s | %.2f | %.2f to %.2f | %s |\n", name, version, m, r[1], r[NR], c}'
    done
  done
}

if [ -n "$result" ]; then
  report | tee "$result"
else
  report
fi
