import { HocuspocusProvider, HocuspocusProviderWebsocket } from '@hocuspocus/provider';
import WebSocket from 'ws';
import * as Y from 'yjs';
import { coeditingPath } from '#shared/api/presence.ts';
import { documentIn, textField } from '#shared/document/shared-text.ts';
import { textOf } from '#shared/document/text-of.ts';
import type { Caller } from './server.ts';

/** One person's window on the shared text of a page, without an editor: what a browser holds behind its screen. */
export class Writer {
  readonly text = new Y.Doc();
  readonly refusals: string[] = [];
  readonly provider: HocuspocusProvider;
  private readonly socket: HocuspocusProviderWebsocket;

  constructor({ url, cookie }: Caller, pageId: string) {
    class WithCookie extends WebSocket {
      constructor(address: string) {
        super(address, { headers: { cookie, origin: url } });
      }
    }
    this.socket = new HocuspocusProviderWebsocket({
      url: `${url.replace('http', 'ws')}${coeditingPath}`,
      WebSocketPolyfill: WithCookie,
    });
    this.provider = new HocuspocusProvider({
      websocketProvider: this.socket,
      name: pageId,
      document: this.text,
      token: 'cookie',
      onAuthenticationFailed: ({ reason }) => this.refusals.push(reason),
    });
    this.provider.attach();
  }

  get fragment(): Y.XmlFragment {
    return this.text.getXmlFragment(textField);
  }

  get words(): string {
    const held = documentIn(this.text);
    return held.ok ? textOf(held.value) : JSON.stringify(held.error);
  }

  /** Puts a paragraph at the end of the page. */
  add(words: string): void {
    const paragraph = new Y.XmlElement('paragraph');
    paragraph.insert(0, [new Y.XmlText(words)]);
    this.fragment.push([paragraph]);
  }

  /** Types at the end of a paragraph of the page. */
  append(block: number, words: string): void {
    const [run] = (this.fragment.get(block) as Y.XmlElement).toArray() as [Y.XmlText];
    run.insert(run.length, words);
  }

  close(): void {
    this.provider.destroy();
    this.socket.destroy();
  }
}
