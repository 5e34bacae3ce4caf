/** One thing that is wrong with a document: where (JSON Pointer, RFC 6901) and what would be right. */
export interface DocumentError {
  pointer: string;
  detail: string;
}
