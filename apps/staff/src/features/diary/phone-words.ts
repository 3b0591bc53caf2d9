/** "+447700900208" as it is read out: "07700 900208". A number from abroad stays as it is. */
export function phoneWords(e164: string): string {
  const home = /^\+44(\d{4})(\d{5,6})$/.exec(e164);
  return home ? `0${home[1]} ${home[2]}` : e164;
}
