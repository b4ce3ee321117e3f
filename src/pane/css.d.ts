/** Style sheets arrive as text and are adopted by the document. */
declare module "*.css" {
  const text: string;
  export default text;
}
