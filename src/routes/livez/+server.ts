/** Open to everybody: the process answers. */
export const GET = () => new Response('ok');
