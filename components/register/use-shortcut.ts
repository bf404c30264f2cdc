'use client';

import { useEffect, useEffectEvent, useSyncExternalStore } from 'react';

const SWITCH = 'evenrun.keys';
const CHANGED = 'evenrun:keys';

/**
 * Runs `act` when `key` is pressed outside of any box. Single keys can be switched off by the person
 * (WCAG 2.1.4); with `ctrl` the key needs Ctrl or ⌘ and always works.
 */
export function useShortcut(key: string, act: () => void, ctrl = false) {
  const run = useEffectEvent((event: KeyboardEvent) => {
    if (event.key !== key || event.defaultPrevented || event.altKey) return;
    if ((event.ctrlKey || event.metaKey) !== ctrl) return;
    if (!ctrl && (isTyping(event.target) || !keysAreOn())) return;
    event.preventDefault();
    act();
  });
  useEffect(() => {
    const listen = (event: KeyboardEvent) => run(event);
    document.addEventListener('keydown', listen);
    return () => document.removeEventListener('keydown', listen);
  }, []);
}

/** Whether single-key shortcuts are on in this browser, and the switch for it. */
export function useKeysSwitch(): [boolean, (on: boolean) => void] {
  const on = useSyncExternalStore(subscribe, keysAreOn, () => true);
  return [on, switchKeys];
}

function switchKeys(on: boolean) {
  localStorage.setItem(SWITCH, on ? 'on' : 'off');
  window.dispatchEvent(new Event(CHANGED));
}

function keysAreOn(): boolean {
  return localStorage.getItem(SWITCH) !== 'off';
}

function subscribe(onChange: () => void) {
  window.addEventListener(CHANGED, onChange);
  window.addEventListener('storage', onChange);
  return () => {
    window.removeEventListener(CHANGED, onChange);
    window.removeEventListener('storage', onChange);
  };
}

function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  return target.isContentEditable || target.matches('input, textarea, select, [role="combobox"]');
}
