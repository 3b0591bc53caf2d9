/** Five withies bound: the mark. One ink, 28 px or more. */
export function Mark({ title }: { title?: string }) {
  return (
    <svg
      viewBox="1 0 46 48"
      role={title ? "img" : undefined}
      aria-hidden={title ? undefined : true}
      aria-label={title}
    >
      <g fill="none" stroke="currentColor">
        <g strokeWidth="1.7" strokeLinecap="round">
          <path d="M20.2 26.4C19.6 19.6 12 16 8.8 6.8" />
          <path d="M22.1 26.4C21.9 18.8 17.4 13 16.2 3.6" />
          <path d="M24 26.4C24 18 24.7 11 24.2 2" />
          <path d="M25.9 26.4C26.1 18.8 31 13 32.6 4.2" />
          <path d="M27.8 26.4C28.4 19.8 36.6 16.4 40 8.4" />
        </g>
        <path
          strokeWidth="1.7"
          d="M20.2 36C19.8 39.6 18 43 16.2 46M22.1 36C21.9 40 21 43.4 20 46.6M24 36V46.8M25.9 36C26.1 40 27 43.4 28 46.6M27.8 36C28.2 39.6 30 43 31.8 46"
        />
        <path
          strokeWidth="2.1"
          strokeLinecap="round"
          d="M18.4 28.6C21.2 29.9 26.8 29.9 29.6 27.9M18.2 31.7C21 33 27 33 29.8 31M18.4 34.8C21.2 36.1 26.4 36.1 29.4 34.2 32.4 32.6 34 35.6 36.6 34"
        />
      </g>
      <path
        fill="currentColor"
        d="M34.6 15.2C38.4 14.4 41.8 16 43.8 19.4 40 20 36.6 18.6 34.6 15.2ZM12.9 14.4C9.4 13 5.8 14 3.6 17 7.2 18.4 10.8 17.6 12.9 14.4ZM24.4 9.6C26.8 7.6 27.8 4.8 27.2 1.6 24.6 3.4 23.6 6.4 24.4 9.6Z"
      />
    </svg>
  );
}
