import request, { type Agent, type Response } from 'supertest';
import { problem, type Problem } from '#shared/contracts/problem.ts';

/** Whatever a route answers, before a test looks at it. */
export type Body = ReturnType<typeof JSON.parse>;

const base = '/api/v1';

/** One browser: a cookie jar, and the form token that goes with it. */
export class Client {
  readonly name: string;
  readonly agent: Agent;
  userId: string | null = null;
  token = '';

  constructor(url: string, name: string) {
    this.name = name;
    this.agent = request.agent(url);
  }

  async fetchToken(): Promise<void> {
    const answer = await this.agent.get(`${base}/auth/csrf`).expect(200);
    this.token = String(answer.body.token);
  }

  /** The real flow of the sign-in page: a form token, then e-mail and password, then the token that came back. */
  async signIn(email: string, password: string): Promise<Response> {
    await this.fetchToken();
    const answer = await this.post('/auth/sign-in', { email, password });
    if (answer.status === 200) {
      this.token = String(answer.headers['x-csrf-token']);
      this.userId = (answer.body as { user: { id: string } }).user.id;
    }
    return answer;
  }

  get(path: string, headers: Record<string, string> = {}): Promise<Response> {
    return Promise.resolve(this.agent.get(base + path).set(headers));
  }

  post(path: string, body?: unknown, headers: Record<string, string> = {}): Promise<Response> {
    const sent = this.agent.post(base + path).set({ 'X-CSRF-Token': this.token, ...headers });
    return Promise.resolve(body === undefined ? sent : sent.send(body as object));
  }

  patch(path: string, body: unknown, headers: Record<string, string> = {}): Promise<Response> {
    return Promise.resolve(this.agent.patch(base + path).set({ 'X-CSRF-Token': this.token, 'Content-Type': 'application/merge-patch+json', ...headers }).send(JSON.stringify(body)));
  }

  send(method: string, path: string, body?: unknown): Promise<Response> {
    if (method === 'GET') return this.get(path);
    return method === 'PATCH' ? this.patch(path, body ?? {}) : this.post(path, body);
  }
}

/** The answer's body, once it has the status expected; what was answered instead is in the message. */
export function okBody(answer: Response, status = 200): Body {
  if (answer.status !== status) throw new Error(`${answer.request.method} ${answer.request.url} answered ${answer.status}, not ${status}: ${answer.text.slice(0, 800)}`);
  return answer.body as Body;
}

/** The problem document an answer must be, by its contract. */
export function problemOf(answer: Response): Problem {
  if (answer.status < 400) throw new Error(`${answer.request.method} ${answer.request.url} answered ${answer.status}, not a problem: ${answer.text.slice(0, 400)}`);
  if (!String(answer.headers['content-type']).startsWith('application/problem+json')) throw new Error(`${answer.request.url}: ${String(answer.headers['content-type'])} is no problem document: ${answer.text.slice(0, 400)}`);
  const body = problem.strict().parse(JSON.parse(answer.text));
  if (body.status !== answer.status) throw new Error(`The problem document says ${body.status}, the answer ${answer.status}.`);
  return body;
}

/** Status and code, for tables of refusals. */
export const refusalOf = (answer: Response): [number, string] => [answer.status, problemOf(answer).code];
