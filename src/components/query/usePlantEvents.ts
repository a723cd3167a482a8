import { useEffect, useRef, useState } from 'react';
import type { PlantNotice } from '../../contracts/week';

type NoticeListener = (notice: PlantNotice | null) => void;

function parseNotice(data: string): PlantNotice | null {
  try {
    const value = JSON.parse(data) as PlantNotice;
    return typeof value.kind === 'string' ? value : null;
  } catch {
    return null;
  }
}

/**
 * Follows the plant's notices. A hidden tab closes its stream (a browser allows six over HTTP/1.1) and asks for
 * everything anew when it is shown (null: anything may have been missed). Gives false while the connection is lost.
 */
export function usePlantEvents(onNotice: NoticeListener): boolean {
  const [connected, setConnected] = useState(true);
  const latest = useRef(onNotice);
  useEffect(() => {
    latest.current = onNotice;
  });

  useEffect(() => {
    let source: EventSource | null = null;
    let openedBefore = false;
    const open = (): void => {
      if (source || document.visibilityState === 'hidden') return;
      source = new EventSource('/api/events');
      source.onopen = () => {
        setConnected(true);
        if (openedBefore) latest.current(null);
        openedBefore = true;
      };
      source.onerror = () => setConnected(false);
      source.onmessage = (event: MessageEvent<string>) => {
        const notice = parseNotice(event.data);
        if (notice) latest.current(notice);
      };
    };
    const close = (): void => {
      source?.close();
      source = null;
    };
    const followVisibility = (): void => (document.visibilityState === 'hidden' ? close() : open());
    open();
    document.addEventListener('visibilitychange', followVisibility);
    window.addEventListener('pagehide', close);
    window.addEventListener('pageshow', open);
    return () => {
      document.removeEventListener('visibilitychange', followVisibility);
      window.removeEventListener('pagehide', close);
      window.removeEventListener('pageshow', open);
      close();
    };
  }, []);

  return connected;
}
