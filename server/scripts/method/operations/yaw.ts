import { yawInputSchema } from '#shared/contracts/method/yaw';
import { evaluateYaw } from '#shared/core/reduction/yaw/yaw-ratio';
import { operation } from '../operation';

export const yaw = operation(yawInputSchema, evaluateYaw);
