'use client'

import { type KeyboardEvent, type PointerEvent, useRef } from 'react'
import type { Point } from '../drawing/drafting-style'
import { classNames } from '../ui/class-names'

export interface DragHandleProps {
  label: string
  at: Point
  /** Which way it moves, in degrees clockwise from the right; shown by its arrows. */
  directionDeg: number
  value: number
  valueText: string
  minimum: number
  maximum: number
  step: number
  /** The value after the pointer has moved so far from where the handle was taken, px. */
  valueAfter: (moved: Point) => number
  onChange: (value: number) => void
  onHold: (isHeld: boolean) => void
}

const largeStep = 10

/** Steps on the grid of the step, so that dragging and typing arrive at the same figures. */
export function snapped(value: number, step: number, minimum: number, maximum: number): number {
  const onGrid = Math.round(value / step) * step
  return Math.min(maximum, Math.max(minimum, Number(onGrid.toFixed(6))))
}

/** A handle on the drawing: dragged by finger or mouse, stepped by the arrow keys, read out with its value. */
export function DragHandle(props: DragHandleProps) {
  const { label, at, directionDeg, value, valueText, minimum, maximum, step, onChange, onHold } = props
  const taken = useRef<{ start: Point; valueAfter: DragHandleProps['valueAfter'] } | null>(null)

  function handlePointerDown(event: PointerEvent<HTMLDivElement>) {
    event.currentTarget.setPointerCapture(event.pointerId)
    taken.current = { start: { x: event.clientX, y: event.clientY }, valueAfter: props.valueAfter }
    onHold(true)
  }

  function handlePointerMove(event: PointerEvent<HTMLDivElement>) {
    const held = taken.current
    if (!held) return
    const moved = { x: event.clientX - held.start.x, y: event.clientY - held.start.y }
    const next = snapped(held.valueAfter(moved), step, minimum, maximum)
    if (next !== value) onChange(next)
  }

  function handleRelease() {
    if (!taken.current) return
    taken.current = null
    onHold(false)
  }

  function handleKeyDown(event: KeyboardEvent<HTMLDivElement>) {
    const steps = keySteps(event)
    if (steps === null) return
    event.preventDefault()
    const next = steps === 'least' ? minimum : steps === 'most' ? maximum : value + steps * step
    onChange(snapped(next, step, minimum, maximum))
  }

  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={minimum}
      aria-valuemax={maximum}
      aria-valuenow={value}
      aria-valuetext={valueText}
      aria-orientation={Math.abs(directionDeg) % 180 === 90 ? 'vertical' : 'horizontal'}
      title={label}
      className={classNames(
        'group absolute z-10 -mt-[22px] -ml-[22px] grid size-11 touch-none place-items-center rounded-full print:hidden',
        'cursor-grab active:cursor-grabbing focus-visible:outline-offset-[-4px]',
      )}
      style={{ left: at.x, top: at.y }}
      onPointerDown={handlePointerDown}
      onPointerMove={handlePointerMove}
      onPointerUp={handleRelease}
      onPointerCancel={handleRelease}
      onKeyDown={handleKeyDown}
    >
      <svg
        viewBox="-14 -14 28 28"
        className="size-7"
        aria-hidden="true"
        style={{ transform: `rotate(${directionDeg}deg)` }}
      >
        <circle
          r={9.5}
          fill="var(--sheet)"
          stroke="var(--accent)"
          strokeWidth={2}
          className="group-hover:fill-accent-wash"
        />
        <path d="M-6.2 0l3.4 -3.2v6.4ZM6.2 0l-3.4 -3.2v6.4Z" fill="var(--accent)" />
      </svg>
    </div>
  )
}

function keySteps(event: KeyboardEvent): number | 'least' | 'most' | null {
  const times = event.shiftKey ? largeStep : 1
  switch (event.key) {
    case 'ArrowUp':
    case 'ArrowRight':
      return times
    case 'ArrowDown':
    case 'ArrowLeft':
      return -times
    case 'PageUp':
      return largeStep
    case 'PageDown':
      return -largeStep
    case 'Home':
      return 'least'
    case 'End':
      return 'most'
    default:
      return null
  }
}
