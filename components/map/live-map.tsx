'use client';

import 'maplibre-gl/dist/maplibre-gl.css';
import type { Map as MapLibreMap } from 'maplibre-gl';
import { type ReactNode, useEffect, useRef, useState } from 'react';
import { createPortal } from 'react-dom';
import { PlaceName } from './lettering';
import { liveStyle } from './live-style';
import { MapFrame } from './map-frame';
import { hatchTile, TILE_RATIO, treeImage } from './map-images';
import { inksAt } from './map-inks';
import { MapPost } from './map-post';

/** A post of the live map: a garden at its neighbourhood's own point. */
export interface LivePost {
  readonly number: number;
  readonly areaKey: string;
  readonly areaName: string;
  readonly labelPoint: readonly [number, number];
  readonly name: string;
  readonly href: string;
}

interface LiveMapProps {
  readonly posts: readonly LivePost[];
  /** West, south, east, north of the printed sheet. */
  readonly sheet: readonly [number, number, number, number];
  /** The printed map, which stays where no live one can be drawn. */
  readonly children: ReactNode;
}

/** How wide the printed map is drawn, in points. */
const PRINTED_WIDTH = 700;

const canDraw = (): boolean => 'WebGL2RenderingContext' in window && document.createElement('canvas').getContext('webgl2') !== null;

/** Draws the map into `frame` and hangs an empty element at each post; resolves when the first picture stands, with null when something of it was not to be had. */
async function drawMap(frame: HTMLElement, { posts, sheet }: Omit<LiveMapProps, 'children'>): Promise<{ map: MapLibreMap; places: HTMLElement[] } | null> {
  const { Map, Marker, setWorkerUrl } = await import('maplibre-gl');
  setWorkerUrl('/vendor/maplibre-gl-worker.mjs');
  const [west, south, east, north] = sheet;
  const map = new Map({
    container: frame, style: styleFor(frame, posts), maxBounds: [west - 0.03, south - 0.03, east + 0.03, north + 0.03],
    maxZoom: 13.5, attributionControl: false, cooperativeGestures: true, dragRotate: false, pitchWithRotate: false, touchPitch: false, fadeDuration: 0,
    locale: { 'Map.Title': 'Map of the valley, which arrow keys move and plus and minus magnify' },
  });
  let isWhole = true;
  map.on('error', () => (isWhole = false));
  map.touchZoomRotate.disableRotation();
  map.keyboard.disableRotation();
  map.on('style.load', () => addImages(map, frame, posts));
  const places = posts.map((post) => {
    const place = document.createElement('div');
    const together = posts.filter(({ areaKey }) => areaKey === post.areaKey);
    const aside = (together.indexOf(post) - (together.length - 1) / 2) * 40;
    new Marker({ element: place, anchor: 'bottom', offset: [aside, 12] }).setLngLat([...post.labelPoint]).addTo(map);
    return place;
  });
  await map.once('load');
  map.fitBounds([west, south, east, north], { animate: false }); // earlier, the bounds would yield to maxBounds
  await map.once('idle');
  if (isWhole) return { map, places };
  map.remove();
  return null;
}

const styleFor = (frame: HTMLElement, posts: readonly LivePost[]) => liveStyle(location.origin, posts.filter(({ areaKey }, i) => posts.findIndex((other) => other.areaKey === areaKey) === i), inksAt(frame));

function addImages(map: MapLibreMap, frame: HTMLElement, posts: readonly LivePost[]): void {
  const inks = inksAt(frame);
  const put = (name: string, image: ImageData): void => {
    if (map.hasImage(name)) map.updateImage(name, image);
    else map.addImage(name, image, { pixelRatio: TILE_RATIO });
  };
  put('tree', treeImage(inks));
  for (const { number } of posts) put(`hatch-${number}`, hatchTile(number, inks));
}

/** Calls back when the reader, or the hour, changes between day and evening ink. */
function onInkChange(change: () => void): () => void {
  const dark = matchMedia('(prefers-color-scheme: dark)');
  const watcher = new MutationObserver(change);
  watcher.observe(document.documentElement, { attributes: true, attributeFilter: ['data-scheme'] });
  dark.addEventListener('change', change);
  return () => {
    watcher.disconnect();
    dark.removeEventListener('change', change);
  };
}

/** The valley as a map that moves, laid over the printed one once it has drawn itself. Its posts are the same links. */
export function LiveMap({ posts, sheet, children }: LiveMapProps) {
  const frame = useRef<HTMLDivElement>(null);
  const live = useRef<MapLibreMap | null>(null);
  const [places, setPlaces] = useState<readonly HTMLElement[] | null>(null);

  useEffect(() => {
    const at = frame.current;
    if (!at || !canDraw()) return;
    let isGone = false;
    let stop = (): void => undefined;
    const watcher = new IntersectionObserver(([entry]) => {
      if (!entry?.isIntersecting) return;
      watcher.disconnect();
      void drawMap(at, { posts, sheet }).then((made) => {
        if (!made) return;
        if (isGone) return made.map.remove();
        live.current = made.map;
        stop = onInkChange(() => made.map.setStyle(styleFor(at, posts), { diff: false }));
        setPlaces(made.places);
      });
    });
    watcher.observe(at);
    return () => {
      isGone = true;
      watcher.disconnect();
      stop();
      live.current?.remove();
      live.current = null;
    };
  }, [posts, sheet]);

  return (
    <MapFrame>
      <div className="relative">
        <div inert={places !== null} className={places === null ? '' : 'invisible'}>{children}</div>
        <div className={`absolute inset-0 border-3 border-ink font-text ${places === null ? 'invisible' : ''}`}>
          <div ref={frame} className="size-full" />
        </div>
        {places && (
          <div className="absolute bottom-3 left-3 flex gap-2">
            <MagnifyButton label="Closer" sign="M4 10H16M10 4V16" press={() => live.current?.zoomIn()} />
            <MagnifyButton label="Wider" sign="M4 10H16" press={() => live.current?.zoomOut()} />
          </div>
        )}
        {places?.map((place, i) => {
          const post = posts[i];
          return post && createPortal(<PostMarker {...post} share={Math.min(1, place.offsetParent ? place.offsetParent.clientWidth / PRINTED_WIDTH : 1)} />, place, String(post.number));
        })}
      </div>
    </MapFrame>
  );
}

/** A post and its neighbourhood's name, as large beside the ground as on the printed map. */
function PostMarker({ number, name, areaName, href, share }: LivePost & { readonly share: number }) {
  return (
    <a href={href} aria-label={`Garden ${number}, ${name}: ${areaName}`} className="flex min-h-11 min-w-11 items-end justify-center">
      <svg width={35 * share} height={54 * share} viewBox="-17.500 -54 35 54" aria-hidden="true" className="overflow-visible">
        <MapPost number={number} height={54} />
        <PlaceName x={0} y={19} name={areaName} size={20} within={145} />
      </svg>
    </a>
  );
}

function MagnifyButton({ label, sign, press }: { readonly label: string; readonly sign: string; readonly press: () => void }) {
  return (
    <button type="button" aria-label={label} onClick={press} className="edged flex size-11 cursor-pointer items-center justify-center bg-paper text-ink">
      <svg width="20" height="20" viewBox="0 0 20 20" aria-hidden="true"><path d={sign} stroke="currentColor" strokeWidth="2.5" /></svg>
    </button>
  );
}
