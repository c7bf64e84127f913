export { toast } from 'sonner';
