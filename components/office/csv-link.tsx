/** Takes a whole table, as it is asked for now, as a file. A plain link: a file is never fetched ahead. */
export function CsvLink({ href, what }: { href: string; what: string }) {
  return <a className="link inline-flex min-h-11 items-center pointer-fine:min-h-7" href={href} download>Take {what} as a CSV file</a>;
}
