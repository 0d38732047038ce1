# shellcheck shell=bash
# Sourced by the other scripts: .venv in the checkout, made from a lock file, each package held to its hash.
#
# .venv/locked names the lock files that .venv is complete for, with their digests; it is written last, so that a
# set-up which was cut short is made anew. .venv.lock keeps two first starts apart and tells that .venv is ours to remake.

say() {
    printf 'selector: %s\n' "$*" >&2 || :
}

give_up() {
    say "$*"
    exit 4
}

find_python() {
    local name found="none"
    for name in python3.11 python3 python3.12 python3.13 python3.14; do
        if "$name" -c 'import sys; sys.exit(sys.version_info < (3, 11))' >/dev/null 2>&1; then
            printf '%s\n' "$name"
            return
        fi
    done
    found=$(python3 -c 'import sys; print("Python %d.%d" % sys.version_info[:2])' 2>/dev/null) || found="no Python"
    give_up "Python 3.11 or newer is needed and was not found (${found}); on Debian: apt install python3 python3-venv"
}

environment_is_complete() {
    local checkout=$1 lines=$2 line
    [[ -x $checkout/.venv/bin/python && -r $checkout/.venv/locked ]] || return 1
    while IFS= read -r line; do
        [[ $'\n'$(<"$checkout/.venv/locked")$'\n' == *$'\n'$line$'\n'* ]] || return 1
    done <<<"$lines"
}

# Sets `options` and `installer` to what makes an environment here and installs into it.
choose_installer() {
    local venv=$1 python=$2
    if "$python" -c 'import venv, ensurepip' >/dev/null 2>&1; then
        options=() installer=("$venv/bin/python" -m pip)
        return
    fi
    # Debian packs ensurepip apart from Python: the system's pip, where there is one, can fill the environment too.
    options=(--without-pip) installer=("$python" -m pip --python "$venv/bin/python")
    if ! "$python" -c 'import venv, pip' >/dev/null 2>&1; then
        give_up "$python can make no environment here; on Debian: apt install python3-venv"
    fi
}

install_packages() {
    local checkout=$1 lock=$2 python=$1/.venv/bin/python log=$1/.venv/set-up.log reason
    # The lock file names every package, so --no-deps leaves pip nothing to look for; compileall does in parallel what
    # pip would do one file after the other.
    if ! PIP_USER=0 "${installer[@]}" install --no-input --disable-pip-version-check --no-deps --no-compile \
        --require-hashes --only-binary :all: -r "$checkout/$lock" >"$log" 2>&1; then
        reason=$(grep '^ERROR' "$log" | tail -n 1) || reason="pip failed"
        give_up "the packages of $lock could not be installed: ${reason#ERROR: } (all of it: $log)"
    fi
    "$python" -m compileall -q -j 0 -x '[/\\]tests?[/\\]' "$checkout/.venv/lib" >>"$log" 2>&1 || :
    # A relative path, so that a checkout that is moved still finds itself.
    printf '../../../..\n' >"$("$python" -c 'import sysconfig; print(sysconfig.get_path("purelib"))')/checkout.pth"
}

make_environment() {
    local checkout=$1 lock=$2 lines=$3 python options installer
    python=$(find_python)
    choose_installer "$checkout/.venv" "$python"
    say "setting up .venv from $lock, once; this takes some seconds"
    rm -f -- "$checkout/.venv/locked"
    rm -rf -- "$checkout/.venv"
    "$python" -m venv "${options[@]}" "$checkout/.venv" >&2 || give_up "$python could not make $checkout/.venv"
    install_packages "$checkout" "$lock"
    printf '%s\n' "$lines" >"$checkout/.venv/locked.new"
    mv -- "$checkout/.venv/locked.new" "$checkout/.venv/locked"
}

# prepare_environment CHECKOUT LOCK [LOCK...]: .venv holds what the first LOCK names, which includes what the others name.
prepare_environment() {
    local checkout=$1 lines
    shift
    lines=$(cd -- "$checkout" && sha256sum -- "$@")
    unset PYTHONPATH PYTHONHOME
    if environment_is_complete "$checkout" "$lines"; then
        return
    fi
    if [[ -e $checkout/.venv && ! -e $checkout/.venv.lock ]]; then
        give_up "$checkout/.venv was made by something else; move it away, then start again"
    fi
    { : >>"$checkout/.venv.lock"; } 2>/dev/null || give_up "$checkout cannot be written, and its .venv is to be made first"
    (
        flock --nonblock 9 || { say "waiting for another set-up to end" && flock 9; }
        environment_is_complete "$checkout" "$lines" || make_environment "$checkout" "$1" "$lines"
    ) 9>>"$checkout/.venv.lock" </dev/null
}
