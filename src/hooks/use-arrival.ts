import { useEffect, useRef } from 'react';
import { NavigationType, useLocation, useNavigationType } from 'react-router-dom';

/** Names the page in the title, and moves the focus to its heading after a change of page; a page that was loaded keeps it. */
export function useArrival(): void {
  const { pathname } = useLocation();
  const wasLoaded = useRef(useNavigationType() === NavigationType.Pop);
  useEffect(() => {
    const arrive = (): boolean => {
      const heading = document.querySelector('h1');
      if (!heading) return false;
      document.title = `${heading.textContent} · Ferrule`;
      if (!wasLoaded.current) {
        heading.tabIndex = -1;
        heading.focus({ preventScroll: true });
      }
      wasLoaded.current = false;
      return true;
    };
    if (arrive()) return;
    const watcher = new MutationObserver(() => {
      if (arrive()) watcher.disconnect();
    });
    watcher.observe(document.body, { childList: true, subtree: true });
    return () => watcher.disconnect();
  }, [pathname]);
}
