declare module 'aws4' {
	export interface Signable {
		host: string;
		path: string;
		method?: string;
		service?: string;
		region?: string;
		signQuery?: boolean;
		headers?: Record<string, string>;
		body?: string;
	}
	export function sign(
		request: Signable,
		credentials: { accessKeyId: string; secretAccessKey: string }
	): { path: string; headers: Record<string, string> };
}
