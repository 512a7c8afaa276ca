import { useLocalStorage } from '@mantine/hooks';
import { useEffect, useRef } from 'react';
import { useNavigate } from 'react-router-dom';
import { NAV, NAV_MORE } from './nav-items';

/** Single-key shortcuts can be switched off (WCAG 2.2, 2.1.4). */
export function useShortcutsAllowed() {
  return useLocalStorage({
    key: 'furrowlight-shortcuts',
    defaultValue: true,
    getInitialValueInEffect: false,
  });
}

function typing(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable ||
      target.closest('input, textarea, select, [role="dialog"]') !== null)
  );
}

/** `g` and then a page's letter goes there. */
export function useJumpKeys(): void {
  const [allowed] = useShortcutsAllowed();
  const navigate = useNavigate();
  const armedAt = useRef(0);
  useEffect(() => {
    if (!allowed) return undefined;
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || typing(event.target)) return;
      if (event.key === 'g') {
        armedAt.current = event.timeStamp;
        return;
      }
      const armed = armedAt.current > 0 && event.timeStamp - armedAt.current < 1500;
      armedAt.current = 0;
      const item = armed && [...NAV, ...NAV_MORE].find(({ key }) => key === event.key);
      if (item) {
        event.preventDefault();
        void navigate(item.to);
      }
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [allowed, navigate]);
}
