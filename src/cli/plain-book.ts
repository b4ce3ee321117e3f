export function plainBook(_book: string, _out: string): number {
  return 2;
}
