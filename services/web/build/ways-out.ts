/** Finds in a script what could send something away or keep it in the browser. */

const names = [
  'fetch',
  'XMLHttpRequest',
  'WebSocket',
  'WebSocketStream',
  'WebTransport',
  'EventSource',
  'RTCPeerConnection',
  'webkitRTCPeerConnection',
  'sendBeacon',
  'importScripts',
  'serviceWorker',
  'BroadcastChannel',
  'SharedWorker',
  'localStorage',
  'sessionStorage',
  'indexedDB',
  'cookieStore',
  'caches',
];

const called = new RegExp(
  `(?<![\\w$])(?:${names.join('|')})(?![\\w$])|(?<=document\\s*\\.\\s*)cookie(?![\\w$])|(?<=window\\s*\\.\\s*)open\\s*\\(|(?<![\\w$.])import\\s*\\(`,
  'g',
);

/** The names, each once, wherever they stand in the code. A word in a text that people read counts too; say it differently there. */
export const ways = (code: string): readonly string[] => [...new Set(code.match(called))].sort();
