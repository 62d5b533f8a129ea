import { useEffect, useRef } from 'react';
import { Outlet, ScrollRestoration, useLocation } from 'react-router-dom';
import { ToastArea } from '../ui/toast';

export function RootLayout() {
  useFocusOnArrival();
  return (
    <>
      <Outlet />
      <ToastArea />
      <ScrollRestoration />
    </>
  );
}

/** A new page is announced and read from its content on, as after a full page load. */
function useFocusOnArrival(): void {
  const { pathname } = useLocation();
  const lastPath = useRef(pathname);
  useEffect(() => {
    if (lastPath.current === pathname) return;
    lastPath.current = pathname;
    const main = document.getElementById('main');
    if (main && !main.contains(document.activeElement)) main.focus({ preventScroll: true });
  }, [pathname]);
}
