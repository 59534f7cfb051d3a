export type ReadMessage = Record<"messageId" | "from" | "to" | "subject" | "date" | "text" | "html", string>;
export function readMessage(raw: string): ReadMessage;
