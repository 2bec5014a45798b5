import { type KeyboardEvent, type PointerEvent, type RefObject, useEffect, useRef } from 'react';
import { type Stretch, pan, zoom } from './trace-window';

interface Gestures {
  /** The box whose width is the window. */
  box: RefObject<HTMLElement | null>;
  window: Stretch;
  whole: Stretch;
  onWindow: (window: Stretch) => void;
}

/**
 * Moving through a trace: drag or swipe to pan, pinch or Ctrl with the wheel to zoom, arrows, plus, minus and Home on the
 * keyboard. The plain wheel and a vertical swipe go on scrolling the page. Every one of them has a button beside the plot.
 */
export function useTraceGestures({ box, window, whole, onWindow }: Gestures) {
  const pointers = useRef(new Map<number, number>());
  const latest = useRef({ window, whole, onWindow });
  useEffect(() => {
    latest.current = { window, whole, onWindow };
  });

  const timeAt = (x: number) => {
    const frame = box.current?.getBoundingClientRect();
    const { window: now } = latest.current;
    return frame ? now.from + ((x - frame.left) / frame.width) * (now.to - now.from) : now.from;
  };

  useEffect(() => {
    const element = box.current;
    // React's own wheel listener is passive and could not keep the browser from zooming the page.
    const wheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !event.metaKey) return;
      event.preventDefault();
      const { window: now, whole: all, onWindow: tell } = latest.current;
      tell(zoom(now, event.deltaY > 0 ? 1.25 : 0.8, timeAt(event.clientX), all));
    };
    element?.addEventListener('wheel', wheel, { passive: false });
    return () => element?.removeEventListener('wheel', wheel);
  });

  function onPointerDown(event: PointerEvent<HTMLElement>) {
    if (event.pointerType === 'mouse' && event.button !== 0) return;
    pointers.current.set(event.pointerId, event.clientX);
    event.currentTarget.setPointerCapture(event.pointerId);
  }

  function onPointerMove(event: PointerEvent<HTMLElement>) {
    const before = pointers.current.get(event.pointerId);
    if (before === undefined) return;
    const width = box.current?.getBoundingClientRect().width || 1;
    const others = [...pointers.current].filter(([id]) => id !== event.pointerId).map(([, x]) => x);
    pointers.current.set(event.pointerId, event.clientX);
    const [other] = others;
    if (other === undefined) return onWindow(pan(window, (before - event.clientX) / width, whole));
    const apart = Math.max(8, Math.abs(event.clientX - other));
    onWindow(zoom(window, Math.max(8, Math.abs(before - other)) / apart, timeAt((event.clientX + other) / 2), whole));
  }

  function onPointerUp(event: PointerEvent<HTMLElement>) {
    pointers.current.delete(event.pointerId);
  }

  function onKeyDown(event: KeyboardEvent) {
    const middle = (window.from + window.to) / 2;
    const moves: Record<string, () => Stretch> = {
      ArrowLeft: () => pan(window, -0.1, whole),
      ArrowRight: () => pan(window, 0.1, whole),
      '+': () => zoom(window, 0.5, middle, whole),
      '=': () => zoom(window, 0.5, middle, whole),
      '-': () => zoom(window, 2, middle, whole),
      Home: () => whole,
    };
    const move = event.target === event.currentTarget ? moves[event.key] : undefined;
    if (!move || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    onWindow(move());
  }

  return { onPointerDown, onPointerMove, onPointerUp, onPointerCancel: onPointerUp, onKeyDown, timeAt };
}
