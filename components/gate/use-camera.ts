import { useCallback, useEffect, useEffectEvent, useRef, useState } from 'react';

/** What the camera is doing. `refused`: the helper or the phone said no; `none`: there is no camera, or no scanner. */
export type CameraState = 'starting' | 'watching' | 'refused' | 'none';

const EVERY_MS = 140;
/** A code that stays in view is one showing; it counts as shown again after so many looks without it, about 4 s. */
const LOOKS_AWAY = 28;

const NOTHING = { text: '', looksAway: 0 };

type Camera = { show: (screen: HTMLVideoElement | null) => void; state: CameraState; forget: () => void };

/**
 * Watches through the camera for codes, while a screen shows what it sees. The scanner is fetched only here, and only
 * when a camera may be used.
 */
export function useCamera(onCode: (text: string) => void): Camera {
  const screen = useRef<HTMLVideoElement | null>(null);
  const stream = useRef<MediaStream | null>(null);
  const last = useRef({ text: '', looksAway: 0 });
  const [state, setState] = useState<CameraState>('starting');
  const play = useCallback(() => {
    if (screen.current === null || stream.current === null) return;
    screen.current.srcObject = stream.current;
    screen.current.play().catch(() => undefined); // interrupted when the helper is faster than the camera
  }, []);
  const show = useCallback((element: HTMLVideoElement | null) => {
    screen.current = element;
    play();
  }, [play]);
  const look = useEffectEvent((text: string | null) => {
    const { text: before, looksAway } = last.current;
    if (text === null) last.current = looksAway + 1 >= LOOKS_AWAY ? NOTHING : { text: before, looksAway: looksAway + 1 };
    else last.current = { text, looksAway: 0 };
    if (text !== null && text !== before) onCode(text);
  });
  useEffect(() => {
    const ended = new AbortController();
    const begin = async () => {
      const opened = await openCamera(setState);
      if (opened === null) return;
      ended.signal.addEventListener('abort', () => opened.getTracks().forEach((track) => track.stop()));
      if (ended.signal.aborted) return opened.getTracks().forEach((track) => track.stop());
      stream.current = opened;
      play();
      const detector = await loadScanner();
      setState(detector === null ? 'none' : 'watching');
      while (detector !== null && !ended.signal.aborted) {
        if (screen.current !== null) {
          const code = await readCode(detector, screen.current);
          if (!ended.signal.aborted) look(code);
        }
        await new Promise((resolve) => setTimeout(resolve, EVERY_MS));
      }
    };
    void begin();
    return () => ended.abort();
  }, [play]);
  return { show, state, forget: () => (last.current = NOTHING) };
}

async function openCamera(tell: (state: CameraState) => void): Promise<MediaStream | null> {
  if (!('mediaDevices' in navigator)) {
    tell('none'); // an insecure address or a very old phone
    return null;
  }
  try {
    return await navigator.mediaDevices.getUserMedia({ video: { facingMode: 'environment', width: { ideal: 1280 } }, audio: false });
  } catch (error) {
    tell(error instanceof DOMException && error.name === 'NotAllowedError' ? 'refused' : 'none');
    return null;
  }
}

type Detector = { detect(source: HTMLVideoElement): Promise<{ rawValue: string }[]> };

async function loadScanner(): Promise<Detector | null> {
  try {
    const { BarcodeDetector, prepareZXingModule } = await import('barcode-detector/ponyfill');
    // Without this the wasm would come from elsewhere, which the page's security policy refuses.
    prepareZXingModule({ overrides: { locateFile: (path: string, prefix: string) => (path.endsWith('.wasm') ? `/vendor/${path}` : prefix + path) } });
    return new BarcodeDetector({ formats: ['qr_code'] });
  } catch {
    return null; // no signal at the first opening, or no wasm: names and codes still work
  }
}

async function readCode(detector: Detector, screen: HTMLVideoElement): Promise<string | null> {
  if (screen.readyState < HTMLMediaElement.HAVE_CURRENT_DATA) return null;
  const [code] = await detector.detect(screen).catch(() => []); // a frame between two states of the camera
  return code?.rawValue ?? null;
}
