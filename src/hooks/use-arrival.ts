import { useEffect, useRef } from 'react';
import { NavigationType, useLocation, useNavigationType } from 'react-router-dom';

/** The room of a commission that is open, named before the piece: tabs of one piece must be told apart. */
const roomName = (): string | null | undefined =>
  document.querySelector('[data-rooms] [aria-current="page"]')?.textContent;

const nameInTitle = (heading: Element): void => {
  document.title = [roomName(), heading.textContent, 'Ferrule'].filter(Boolean).join(' · ');
};

/**
 * Names the page in the title and, after a change of page, brings its beginning into sight with the focus on its heading,
 * or the section that the address names. A page that was loaded or gone back to stays where the browser puts it.
 */
export function useArrival(): void {
  const { pathname, hash, key } = useLocation();
  const goesBack = useNavigationType() === NavigationType.Pop;
  const goesBackNow = useRef(goesBack);
  useEffect(() => {
    goesBackNow.current = goesBack;
  });
  useEffect(() => {
    const arrive = (): boolean => {
      const heading = document.querySelector<HTMLElement>('h1');
      if (!heading) return false;
      nameInTitle(heading);
      if (goesBackNow.current) return true;
      const section = hash ? document.getElementById(hash.slice(1)) : null;
      const target = section ?? heading;
      target.tabIndex = -1;
      target.focus({ preventScroll: true });
      if (section) section.scrollIntoView();
      else window.scrollTo(0, 0);
      return true;
    };
    if (arrive()) return;
    const watcher = new MutationObserver(() => {
      if (arrive()) watcher.disconnect();
    });
    watcher.observe(document.body, { childList: true, subtree: true });
    return () => watcher.disconnect();
    // The key is another one at each navigation, also to where one is.
  }, [pathname, hash, key]);
}
