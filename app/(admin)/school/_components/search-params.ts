export type SearchParams = Promise<Record<string, string | string[] | undefined>>;

/** The parameters of an address that say something: each once, empty ones left out. */
export async function saidIn(params: SearchParams): Promise<Record<string, string>> {
  const said = Object.entries(await params).flatMap(([name, value]) => {
    const text = Array.isArray(value) ? value[0] : value;
    return text ? [[name, text]] : [];
  });
  return Object.fromEntries(said);
}
