/** Redshank's own bird: it rests on one red leg, the other tucked away. */
export function Bird({ size = 32 }: { size?: number }) {
  return (
    <svg
      width={size * 0.875}
      height={size}
      viewBox="0 0 28 32"
      aria-hidden="true"
      className="flex-none"
    >
      <path
        d="M15.2 20.500v9.700h3.8"
        fill="none"
        className="stroke-shank"
        strokeWidth="2"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <path
        d="M1.2 8.4 8 7.100c.6-2.2 2.3-3.5 4.4-3.5 2.3 0 4.1 1.7 4.1 4 0 1.2-.4 2-.3 2.8 4.4.4 8.2 2.6 10.4 7-3.4 2.4-7 3.7-10.5 3.7-4.6 0-7.6-2.6-7.6-6.5 0-2 .6-3.5.4-5.400z"
        fill="currentColor"
      />
      <path
        d="M13.2 12.400c1.2 3.3 4.7 5.4 9.4 5.4"
        fill="none"
        className="stroke-mud"
        strokeWidth="1"
        strokeLinecap="round"
      />
      <circle cx="12.2" cy="7.2" r="1" className="fill-mud" />
    </svg>
  );
}
