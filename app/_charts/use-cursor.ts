'use client';

import { type KeyboardEvent, type PointerEvent, useEffect, useEffectEvent, useRef, useState } from 'react';
import { nearestPoint } from './nearest-point';
import { frameIndex, type PlotFrame } from './plot-frame';

/** A drag shorter than this many pixels is a click. */
const SHORTEST_DRAG = 8;

/**
 * The one cursor of a stack of charts. A pointer moves it and a click leaves it there; arrows, Home and End move it
 * by key; a drag with a mouse or pen selects a span. Arrows pressed while nothing has the focus come here.
 * `pointAt` is the place of the point in `points` under the cursor, null among none.
 */
export function useCursor(args: {
  points: readonly { id: string; index: number }[];
  frame: PlotFrame | null;
  selectedId: string | null;
  onOpen: (place: number) => void;
  onSelect: (fromIndex: number, toIndex: number) => void;
}) {
  const { points, frame } = args;
  const grip = useRef<HTMLDivElement>(null);
  const [pinnedId, setPinnedId] = useState(args.selectedId);
  const [hover, setHover] = useState<number | null>(null);
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null);

  const pinned = points.findIndex((point) => point.id === pinnedId);
  const last = points.length > 0 ? points.length - 1 : null;
  const pointAt = hover !== null && hover < points.length ? hover : pinned >= 0 ? pinned : last;

  const pin = (place: number) => {
    setHover(null);
    setPinnedId(points[Math.max(0, Math.min(points.length - 1, place))]?.id ?? null);
  };

  const pixel = (event: PointerEvent) => event.clientX - event.currentTarget.getBoundingClientRect().left;

  const step = (key: string): number | null => {
    if (pointAt === null || last === null) return null;
    if (key === 'ArrowLeft') return pointAt - 1;
    if (key === 'ArrowRight') return pointAt + 1;
    if (key === 'Home') return 0;
    return key === 'End' ? last : null;
  };

  const takeFreeArrow = useEffectEvent((event: globalThis.KeyboardEvent) => {
    const free = document.activeElement === null || document.activeElement === document.body;
    if (!free || event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key !== 'ArrowLeft' && event.key !== 'ArrowRight') return;
    const next = step(event.key);
    if (next === null) return;
    grip.current?.focus({ preventScroll: true });
    pin(next);
  });

  useEffect(() => {
    const onKey = (event: globalThis.KeyboardEvent) => takeFreeArrow(event);
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, []);

  return {
    pointAt,
    drag,
    grip,
    handlers: {
      onPointerDown: (event: PointerEvent) => {
        if (event.button !== 0 || event.pointerType === 'touch') return;
        event.currentTarget.setPointerCapture(event.pointerId);
        setDrag({ from: pixel(event), to: pixel(event) });
      },
      onPointerMove: (event: PointerEvent) => {
        if (frame === null) return;
        const x = pixel(event);
        setHover(nearestPoint(points, frameIndex(frame, x)));
        setDrag((held) => held && { ...held, to: x });
      },
      onPointerUp: (event: PointerEvent) => {
        const place = frame === null ? null : nearestPoint(points, frameIndex(frame, pixel(event)));
        if (place !== null) pin(place);
        if (drag === null || frame === null) return;
        setDrag(null);
        const [left, right] = [drag.from, pixel(event)].sort((a, b) => a - b) as [number, number];
        if (right - left >= SHORTEST_DRAG) args.onSelect(frameIndex(frame, left), frameIndex(frame, right));
      },
      onPointerLeave: () => setHover(null),
      onPointerCancel: () => setDrag(null),
      onDoubleClick: () => pointAt !== null && args.onOpen(pointAt),
      onKeyDown: (event: KeyboardEvent) => {
        if (event.ctrlKey || event.metaKey || event.altKey) return;
        const next = step(event.key);
        if (next !== null) pin(next);
        else if (event.key === 'Enter' && pointAt !== null) args.onOpen(pointAt);
        else return;
        event.preventDefault();
      },
    },
  };
}
