/** The development server passes API calls on to the API's server, which listens on API_PORT. */
export default {
  '/api': { target: `http://127.0.0.1:${process.env['API_PORT'] ?? '4201'}`, secure: false },
};
