# Bash completion of ringwright. Commands and options are asked of the program's own help, so they
# cannot differ from it. Installed as share/bash-completion/completions/ringwright; in zsh:
#   autoload -U bashcompinit && bashcompinit && source ringwright.bash

_ringwright_commands() {
    "$1" --help 2>/dev/null | sed -n '/^[Ss]ubcommands:/,$ s/^  \([a-z][a-z-]*\)\( .*\)\{0,1\}$/\1/p'
}

_ringwright_options() {
    "$@" --help 2>/dev/null | grep -oE -- '(^|[ ,])--[a-z][a-z0-9-]*' | tr -d ' ,' | sort -u
}

_ringwright() {
    local program="${COMP_WORDS[0]}" current="${COMP_WORDS[COMP_CWORD]}" choices
    COMPREPLY=()
    if [ "$COMP_CWORD" -eq 1 ]; then
        case "$current" in
        -*) choices="$(_ringwright_options "$program")" ;;
        *) choices="$(_ringwright_commands "$program")" ;;
        esac
    else
        case "$current" in
        -*) choices="$(_ringwright_options "$program" "${COMP_WORDS[1]}")" ;;
        *) return ;; # file names, by the shell's default
        esac
    fi
    local choice
    while IFS= read -r choice; do
        [ -n "$choice" ] && COMPREPLY+=("$choice")
    done < <(compgen -W "$choices" -- "$current")
}

complete -o default -F _ringwright ringwright
