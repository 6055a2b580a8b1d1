import { data, type MiddlewareFunction } from "react-router";

/** A body that is no form is the sender's fault: reading it answers 400, and the log has no fault of ours. */
export const readableFormMiddleware: MiddlewareFunction<Response> = async ({ request }, next) => {
  const read = request.formData.bind(request);
  request.formData = () =>
    read().catch(() => {
      throw data({ code: "invalid" }, { status: 400 });
    });
  return next();
};
