/**
 * The R script of the package: reads the runs, refits both models with base R and lme4, and compares with the results.
 * Sum-to-zero contrasts of the sessions make the intercept plus a treatment's coefficient the mean over sessions of equal weight.
 * Checked by: test/core/exchange/package/make-package.test.ts (run with R where it is installed)
 */
export const scriptR = `# Reads this data package, fits the models again and compares with results/means.csv.
# Run it in the folder of the package:  Rscript refit.R
# Needs R; with the package lme4 the model with sessions random is fitted too.

runs <- read.csv("data/runs.csv", stringsAsFactors = FALSE, encoding = "UTF-8")
means <- read.csv("results/means.csv", stringsAsFactors = FALSE, encoding = "UTF-8")
model <- read.csv("results/model.csv", stringsAsFactors = FALSE, encoding = "UTF-8")
worst <- 0

relative <- function(a, b) max(abs(a - b) / pmax(abs(b), 1e-300))

for (m in unique(means$measurand)) {
  terms <- model[model$measurand == m, ]
  y <- paste0("y_", m)
  kept <- runs[runs$ruined != "true" & !is.na(runs[[y]]), ]
  kept$y <- kept[[y]]

  told <- means[means$measurand == m & means$model == "fixed" & !is.na(means$adjusted), ]
  for (part in unique(told$part)) {
    here <- if (is.na(part)) told else told[!is.na(told$part) & told$part == part, ]
    d <- kept[kept$treatment %in% here$treatment, ]
    d$treatment <- factor(d$treatment, levels = here$treatment)
    d$session <- factor(d$session)
    if (nlevels(d$treatment) < 2 || nlevels(d$session) < 2) next
    contrasts(d$session) <- contr.sum(nlevels(d$session))
    formula <- "y ~ 0 + treatment + session"
    if (terms$slot == "true") {
      d$slot <- factor(d$slot)
      contrasts(d$slot) <- contr.sum(nlevels(d$slot))
      formula <- paste(formula, "+ slot")
    }
    shift <- mean(d$y) # taken off first: exact enough for readings with a large common offset
    d$y <- d$y - shift
    fit <- lm(as.formula(formula), data = d)
    L <- paste0("treatment", here$treatment)
    estimate <- coef(fit)[L] + shift
    cat(sprintf("\\n%s, sessions fixed%s\\n", m, if (is.na(part)) "" else paste(", part", part)))
    table <- data.frame(treatment = here$treatment, adjusted = unname(estimate), runs = as.integer(table(d$treatment)))
    difference <- relative(estimate, here$adjusted)
    if (!any(is.na(here$se))) {
      se <- sqrt(diag(vcov(fit))[L])
      table$se <- unname(se)
      difference <- max(difference, relative(se, here$se))
    }
    print(table, digits = 10)
    cat(sprintf("largest relative difference to results/means.csv: %.2e\\n", difference))
    worst <- max(worst, difference)
  }

  told <- means[means$measurand == m & means$model == "random" & !is.na(means$adjusted), ]
  if (nrow(told) > 0 && requireNamespace("lme4", quietly = TRUE)) {
    d <- kept[kept$treatment %in% told$treatment, ]
    d$treatment <- factor(d$treatment, levels = told$treatment)
    d$session <- factor(d$session)
    formula <- "y ~ 0 + treatment + (1 | session)"
    if (terms$slot == "true") {
      d$slot <- factor(d$slot)
      contrasts(d$slot) <- contr.sum(nlevels(d$slot))
      formula <- paste(formula, "+ slot")
    }
    shift <- mean(d$y)
    d$y <- d$y - shift
    control <- lme4::lmerControl(optCtrl = list(xtol_abs = 1e-12, ftol_abs = 1e-14))
    fit <- lme4::lmer(as.formula(formula), data = d, control = control)
    L <- paste0("treatment", told$treatment)
    estimate <- lme4::fixef(fit)[L] + shift
    cat(sprintf("\\n%s, sessions random\\n", m))
    print(data.frame(treatment = told$treatment, adjusted = unname(estimate)), digits = 10)
    print(lme4::VarCorr(fit))
    cat(sprintf("largest relative difference to results/means.csv: %.2e (iterative: about 1e-5 is usual)\\n",
                relative(estimate, told$adjusted)))
  }
}

cat(sprintf("\\nWorst relative difference, sessions fixed: %.3e\\n", worst))
if (worst > 1e-8) stop("The refit does not agree with the results to 1e-8.")
`;
