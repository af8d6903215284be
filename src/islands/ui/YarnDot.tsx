import { yarnDotFill } from '#islands/ui/yarn-dot.ts';

/** A yarn's colour as a small woven square, beside the yarn's name. */
export function YarnDot({ colour }: { colour: string | undefined }) {
  return (
    <svg className="yarn" viewBox="0 0 16 16" aria-hidden>
      <path d="M0 0h16v16H0z" fill={yarnDotFill(colour)} />
      <path d="M0 4h16M0 8h16M0 12h16" stroke="#101c2d" strokeOpacity=".3" />
      <path d="M2 0v4M6 4v4M10 0v4M14 4v4M2 8v4M6 12v4M10 8v4M14 12v4" stroke="#fffdf3" strokeOpacity=".4" strokeWidth="1.4" />
    </svg>
  );
}
