/* Times the coupling coefficients of the GNU Scientific Library for the program in this folder. Commands
 * on standard input, one answer to each on standard output:
 *
 *   load 3j N     then N lines of arguments, each given as twice its value; the answer is "loaded"
 *   time PASSES   calls all sets PASSES times; the answer is the nanoseconds of one call
 *   values        the answer is N lines, a value each, as hexadecimal floating point
 */
#include <gsl/gsl_errno.h>
#include <gsl/gsl_sf_coupling.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>

static int sets[4096][9];
static int count, places;
static volatile double sink;

static double value(const int *q)
{
	if (places == 9)
		return gsl_sf_coupling_9j(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8]);
	if (places == 3)
		return gsl_sf_coupling_3j(q[0], q[1], q[2], q[3], q[4], q[5]);
	return gsl_sf_coupling_6j(q[0], q[1], q[2], q[3], q[4], q[5]);
}

static void load(void)
{
	char symbol[4];
	if (scanf("%3s %d", symbol, &count) != 2 || count < 1 || count > 4096)
		exit(2);
	places = atoi(symbol);
	for (int i = 0; i < count; i++)
		for (int k = 0; k < (places == 9 ? 9 : 6); k++)
			if (scanf("%d", &sets[i][k]) != 1)
				exit(2);
	puts("loaded");
}

static void measure(void)
{
	int passes;
	struct timespec start, end;
	if (scanf("%d", &passes) != 1)
		exit(2);
	double sum = 0;
	clock_gettime(CLOCK_MONOTONIC, &start);
	for (int p = 0; p < passes; p++)
		for (int i = 0; i < count; i++)
			sum += value(sets[i]);
	clock_gettime(CLOCK_MONOTONIC, &end);
	sink = sum;
	printf("%.17g\n", ((end.tv_sec - start.tv_sec) * 1e9 + (end.tv_nsec - start.tv_nsec)) / passes / count);
}

int main(void)
{
	char command[8];
	gsl_set_error_handler_off();
	while (scanf("%7s", command) == 1) {
		if (strcmp(command, "load") == 0)
			load();
		else if (strcmp(command, "time") == 0)
			measure();
		else
			for (int i = 0; i < count; i++)
				printf("%a\n", value(sets[i]));
		fflush(stdout);
	}
	return 0;
}
